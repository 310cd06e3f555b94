import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ApiProblem } from "@/lib/api-client.ts";
import { NotFoundScreen } from "./not-found-screen.tsx";
import { Page } from "./page.tsx";

/** A page whose subject could not be loaded: not there for this reader, or a failure to try again. */
export function LoadProblem({
  what,
  error,
  onRetry,
}: {
  readonly what: string;
  readonly error: unknown;
  readonly onRetry: () => void;
}) {
  const missing = error instanceof ApiProblem && (error.code === "not_found" || error.code === "validation_failed");
  if (missing) return <NotFoundScreen />;
  return (
    <Page title="Not loaded">
      <ProblemNotice what={what} error={error} onRetry={onRetry} />
    </Page>
  );
}
