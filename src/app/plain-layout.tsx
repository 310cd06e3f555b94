import { Outlet } from "react-router-dom";
import { Wordmark } from "./wordmark.tsx";

/** The four marks at the middle of a sheet's edges (centring marks, ISO 5457). */
const marks = [
  "top-0 left-1/2 h-3 w-px",
  "bottom-0 left-1/2 h-3 w-px",
  "left-0 top-1/2 h-px w-3",
  "right-0 top-1/2 h-px w-3",
] as const;

/** Pages outside a shop: sign-in, links, account. One narrow sheet with a drawing's frame; on a phone the frame is the window. */
export function PlainLayout() {
  return (
    <>
      <header className="border-b border-rule px-4 py-1 sm:px-6">
        <Wordmark />
      </header>
      <main tabIndex={-1} className="mx-auto w-full max-w-2xl sm:px-4 sm:py-12">
        <div className="relative sm:border sm:border-ink sm:bg-sheet sm:p-1.5">
          {marks.map((mark) => (
            <span key={mark} aria-hidden="true" className={`absolute hidden bg-ink sm:block ${mark}`} />
          ))}
          <div className="px-4 py-8 sm:border sm:border-ink sm:px-10 sm:py-10">
            <Outlet />
          </div>
        </div>
      </main>
    </>
  );
}
