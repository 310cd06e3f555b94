import { messageOf } from "@/lib/form-problem.ts";
import { Button } from "./button.tsx";
import { Notice } from "./notice.tsx";

/** A load that failed: what happened and a way to try again. */
export function ProblemNotice({
  what,
  error,
  onRetry,
}: {
  /** What was to be shown: "The jobs could not be loaded." */
  readonly what: string;
  readonly error: unknown;
  readonly onRetry?: () => void;
}) {
  return (
    <Notice tone="error" title={what}>
      <p>{messageOf(error)}</p>
      {onRetry && (
        <Button size="small" className="mt-3" onClick={onRetry}>
          Try again
        </Button>
      )}
    </Notice>
  );
}
