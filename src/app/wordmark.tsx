import { Link } from "react-router-dom";
import { paths } from "./paths.ts";

/** The name with two of its letters standing proud; read out as one word. */
export function Wordmark() {
  return (
    <Link to={paths.home()} aria-label="Standproud, home" className="inline-flex min-h-11 items-center no-underline">
      <span aria-hidden="true" className="font-serif text-lg leading-none font-black tracking-tight text-ink">
        St<span className="relative -top-1">a</span>ndpr<span className="relative -top-1">o</span>ud
      </span>
    </Link>
  );
}
