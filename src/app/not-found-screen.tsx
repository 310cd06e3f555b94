import { LinkButton } from "@/components/ui/link-button.tsx";
import { usePageTitle } from "@/lib/page-title.ts";
import { paths } from "./paths.ts";

/** The same for what is not there and for what may not be seen. */
export function NotFoundScreen() {
  usePageTitle("Nothing here");
  return (
    <div className="mx-auto max-w-2xl px-5 py-16">
      <h1 className="font-serif text-2xl font-bold text-ink">There is nothing here that you may see</h1>
      <p className="mt-3 text-base text-graphite">
        The address may be mistyped, or the thing may belong to another shop or client. If you came by a link, ask the
        person who sent it.
      </p>
      <div className="mt-6">
        <LinkButton to={paths.home()}>Go to the start</LinkButton>
      </div>
    </div>
  );
}
