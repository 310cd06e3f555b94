import type { Artwork } from "#shared/contracts/artworks.ts";
import { Busy } from "@/components/ui/busy.tsx";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useCancelTrace } from "../api/mutations.ts";

/** That a picture is being traced again, with a way to give it up, or why it went wrong the last time. */
export function TraceUnderWay({
  shop,
  jobId,
  artwork,
}: {
  readonly shop: string;
  readonly jobId: string;
  readonly artwork: Artwork;
}) {
  const cancel = useCancelTrace(shop, jobId, artwork.id);
  const { asked = null, failure = null } = artwork.trace ?? {};
  if (asked) {
    return (
      <div className="mt-3 max-w-sm space-y-2">
        <Busy label="Tracing it again. Until then it keeps its pieces." />
        {cancel.isError && <Notice tone="error">{messageOf(cancel.error)}</Notice>}
        {artwork.can.trace && (
          <Button size="small" busy={cancel.isPending} onClick={() => cancel.mutate()}>
            Give it up
          </Button>
        )}
      </div>
    );
  }
  return failure ? (
    <Notice tone="error" title="It could not be traced with those choices, and keeps its pieces" className="mt-3">
      {failure.text}
    </Notice>
  ) : null;
}
