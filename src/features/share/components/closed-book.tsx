/** A portfolio link that opens nothing any more. */
export function ClosedBook({ hasRunOut }: { readonly hasRunOut: boolean }) {
  return (
    <main className="mx-auto w-full max-w-2xl px-4 py-20 text-center sm:px-8 sm:py-32">
      <div className="border-y border-ink py-12">
        <h1 className="font-serif text-3xl font-black">
          {hasRunOut ? "This link has run out" : "This book is closed"}
        </h1>
        <p className="mx-auto mt-4 max-w-md text-graphite">
          {hasRunOut
            ? "Portfolio links are open for a while only. The person who sent it to you will gladly send a fresh one."
            : "The shop has closed this link, or the address is not complete. Ask the person who sent it to you, or open it from their message again."}
        </p>
      </div>
    </main>
  );
}
