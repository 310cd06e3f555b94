import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useSendFreshLink } from "../api/mutations.ts";

/** For a link that no longer holds: a fresh one goes to the address the old one went to, nowhere else. */
export function FreshLink({
  token,
  addressHint,
  isOnlyWay = true,
}: {
  readonly token: string;
  readonly addressHint: string | null;
  /** Nothing else on the page leads on. */
  readonly isOnlyWay?: boolean;
}) {
  const send = useSendFreshLink();
  if (send.isSuccess) {
    return (
      <Notice tone="done" title="A fresh link is on its way">
        Look in the mail of {addressHint ?? "the address the old link went to"}. Use the newest mail; older links stay
        closed.
      </Notice>
    );
  }
  return (
    <div className="space-y-4">
      {send.isError && <Notice tone="error">{messageOf(send.error)}</Notice>}
      <Button kind={isOnlyWay ? "primary" : "outline"} busy={send.isPending} onClick={() => send.mutate(token)}>
        Send a fresh one to the same address
      </Button>
      {addressHint && <p className="text-sm text-graphite">It goes to {addressHint}.</p>}
    </div>
  );
}
