import { useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import type { NamedDraft } from "#shared/contracts/named-drafts.ts";
import { Button } from "@/components/ui/button.tsx";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { ApiProblem } from "@/lib/api-client.ts";
import { formatInstant } from "@/lib/format.ts";
import { draftQueries, useRemoveDraft } from "../api/draft-requests.ts";
import { WordButton } from "./cell-controls.tsx";
import { DraftLook } from "./draft-look.tsx";
import type { DraftsOf } from "./drafts-dialog.tsx";
import { RenameDraftForm } from "./rename-draft-form.tsx";

type DraftItemProps = DraftsOf & {
  readonly draft: NamedDraft;
  readonly isLooking: boolean;
  readonly onLook: () => void;
};

/** One draft: who kept it and when, a look at it, and what can be done with it. */
export function DraftItem({ draft, isLooking, onLook, ...of }: DraftItemProps) {
  const client = useQueryClient();
  const remove = useRemoveDraft(of, draft.id);
  const [renaming, setRenaming] = useState(false);
  const [asking, setAsking] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const { onGoBack } = of;

  async function goBack() {
    setProblem(null);
    try {
      onGoBack?.(await client.fetchQuery(draftQueries.one(of, draft.id)));
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      setProblem(error.message);
    }
  }

  return (
    <li className="space-y-2 py-3">
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <div className="min-w-0 flex-1 basis-56">
          {renaming ? (
            <RenameDraftForm {...of} draft={draft} onDone={() => setRenaming(false)} />
          ) : (
            <p className="text-base font-semibold break-words text-ink">{draft.name}</p>
          )}
          <p className="text-sm text-graphite">
            {draft.keptBy}, {formatInstant(draft.keptAt)}
          </p>
        </div>
        <div className="flex flex-wrap items-center gap-x-3">
          <WordButton aria-expanded={isLooking} aria-label={`Look at ${draft.name}`} onClick={onLook}>
            {isLooking ? "Close" : "Look"}
          </WordButton>
          {onGoBack && draft.can.change && (
            <>
              <WordButton aria-label={`Rename ${draft.name}`} onClick={() => setRenaming(true)}>
                Rename
              </WordButton>
              <WordButton aria-label={`Remove ${draft.name}`} onClick={() => setAsking(true)}>
                Remove
              </WordButton>
              <Button size="small" aria-label={`Go back to ${draft.name}`} onClick={() => void goBack()}>
                Go back to it
              </Button>
            </>
          )}
        </div>
      </div>
      {problem && (
        <p role="alert" className="text-sm text-oxblood">
          {problem}
        </p>
      )}
      {isLooking && <DraftLook {...of} draftId={draft.id} name={draft.name} />}
      <ConfirmDialog
        open={asking}
        onOpenChange={setAsking}
        title={`Remove the draft “${draft.name}”?`}
        action="Remove it"
        busy={remove.isPending}
        error={remove.error?.message ?? null}
        onConfirm={() => remove.mutate(undefined, { onSuccess: () => setAsking(false) })}
      >
        <p>It can’t be brought back. The mockup on the desk stays as it is.</p>
      </ConfirmDialog>
    </li>
  );
}
