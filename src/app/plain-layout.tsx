import { Outlet } from "react-router-dom";
import { Wordmark } from "./wordmark.tsx";

/** Pages outside a shop: sign-in, links, account. One narrow column under the wordmark. */
export function PlainLayout() {
  return (
    <>
      <header className="border-b border-rule px-4 py-1 sm:px-6">
        <Wordmark />
      </header>
      <main className="mx-auto w-full max-w-xl px-4 py-8 sm:py-14">
        <Outlet />
      </main>
    </>
  );
}
