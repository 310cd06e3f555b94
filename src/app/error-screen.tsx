import { isRouteErrorResponse, useRouteError } from "react-router-dom";
import { Button } from "@/components/ui/button.tsx";
import { LinkButton } from "@/components/ui/link-button.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { usePageTitle } from "@/lib/page-title.ts";
import { NotFoundScreen } from "./not-found-screen.tsx";
import { paths } from "./paths.ts";
import { useLoadAgain } from "./use-load-again.ts";

/** What shows when a page breaks: it says so, says what is safe and gives two ways on. */
export function ErrorScreen() {
  const error = useRouteError();
  const isLoadedAgain = useLoadAgain(error);
  usePageTitle("Something went wrong");
  if (isRouteErrorResponse(error) && error.status === 404) return <NotFoundScreen />;
  if (isLoadedAgain)
    return (
      <div className="mx-auto max-w-2xl px-5 py-16">
        <Skeleton label="Loading the page again" />
      </div>
    );
  return (
    <div className="mx-auto max-w-2xl px-5 py-16" role="alert">
      <h1 className="font-serif text-2xl font-bold text-ink">This page broke</h1>
      <p className="mt-3 text-base text-graphite">
        What was saved is safe. Loading the page again often helps; if it breaks again, go back to the start.
      </p>
      <div className="mt-6 flex flex-wrap gap-3">
        <Button kind="primary" onClick={() => window.location.reload()}>
          Load it again
        </Button>
        <LinkButton to={paths.home()}>Go to the start</LinkButton>
      </div>
    </div>
  );
}
