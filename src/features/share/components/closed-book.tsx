/** A portfolio link that opens nothing: run out or closed by the shop (which of the two is not told), or never whole. */
export function ClosedBook({ wasOpen }: { readonly wasOpen: boolean }) {
  return (
    <main className="mx-auto w-full max-w-2xl px-4 py-20 text-center sm:px-8 sm:py-32">
      <div className="border-y border-ink py-12">
        <h1 className="font-serif text-3xl font-black">
          {wasOpen ? "This link is no longer open" : "There is no portfolio at this address"}
        </h1>
        <p className="mx-auto mt-4 max-w-md text-graphite">
          {wasOpen
            ? "Portfolio links are open for a while only, and a shop can close them earlier. The person who sent it to you will gladly send a fresh one."
            : "The address may not be complete. Open it from the message it came in, or ask the person who sent it to you."}
        </p>
      </div>
    </main>
  );
}
