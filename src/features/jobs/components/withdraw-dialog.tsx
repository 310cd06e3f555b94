import { useState } from "react";
import type { Revision } from "#shared/contracts/revisions.ts";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useWithdrawRevision } from "../api/mutations.ts";

/** Asks once, with the reason that the log keeps. */
export function WithdrawDialog({
  shop,
  revision,
  onClose,
}: {
  readonly shop: string;
  readonly revision: Revision;
  readonly onClose: () => void;
}) {
  const [reason, setReason] = useState("");
  const [tried, setTried] = useState(false);
  const withdraw = useWithdrawRevision(shop, revision.jobId);
  const empty = reason.trim() === "";
  return (
    <ConfirmDialog
      open
      onOpenChange={onClose}
      title={`Withdraw revision ${revision.letter}?`}
      action={`Withdraw ${revision.letter}`}
      busy={withdraw.isPending}
      error={withdraw.isError ? messageOf(withdraw.error) : null}
      onConfirm={() => {
        setTried(true);
        if (!empty) withdraw.mutate({ revisionId: revision.id, reason: reason.trim() }, { onSuccess: onClose });
      }}
    >
      <p>
        The client can't open it any more and can't decide on it. Its letter is not used again, and earlier revisions
        stay as they are.
      </p>
      <TextArea
        label="Why is it withdrawn?"
        hint="The log keeps this."
        rows={2}
        maxLength={400}
        value={reason}
        onChange={(event) => setReason(event.target.value)}
        error={tried && empty ? "Say why it is withdrawn." : undefined}
      />
    </ConfirmDialog>
  );
}
