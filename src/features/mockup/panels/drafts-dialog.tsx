import { useInfiniteQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { NamedDraftWithDocument } from "#shared/contracts/named-drafts.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Dialog } from "@/components/ui/dialog.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { itemsOf } from "@/lib/pages-query.ts";
import { draftQueries } from "../api/draft-requests.ts";
import { DraftItem } from "./draft-item.tsx";
import { KeepDraftForm } from "./keep-draft-form.tsx";

export type DraftsOf = {
  readonly shop: string;
  readonly jobId: string;
  readonly unit: LengthUnit;
  /** What is on the desk, which drafts are compared with. */
  readonly document: MockupDocument;
  /** Puts a draft on the desk; null for those who may only look. */
  readonly onGoBack: ((draft: NamedDraftWithDocument) => void) | null;
};

type DraftsDialogProps = DraftsOf & { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** States of the mockup that were kept under a name, to look at and to return to. */
export function DraftsDialog({ open, onOpenChange, onGoBack, ...of }: DraftsDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      size="wide"
      title="Drafts"
      description={
        onGoBack === null
          ? "States of this mockup that were kept under a name."
          : "Keep the mockup as it is now under a name, and come back to it whatever you try meanwhile. Undo leads away from a draft again."
      }
    >
      <DraftsPanel
        {...of}
        onGoBack={
          onGoBack &&
          ((draft) => {
            onGoBack(draft);
            onOpenChange(false);
          })
        }
      />
    </Dialog>
  );
}

function DraftsPanel(of: DraftsOf) {
  const drafts = useInfiniteQuery(draftQueries.list(of));
  const [looking, setLooking] = useState<string | null>(null);
  return (
    <div className="space-y-5">
      {of.onGoBack && <KeepDraftForm {...of} />}
      {drafts.isPending && <Skeleton label="Loading the drafts" rows={3} />}
      {drafts.isError && drafts.data === undefined && (
        <ProblemNotice
          what="The drafts could not be loaded."
          error={drafts.error}
          onRetry={() => void drafts.refetch()}
        />
      )}
      {drafts.data && itemsOf(drafts.data).length === 0 && (
        <p className="text-base text-graphite">
          No draft is kept yet.
          {of.onGoBack && " Give this state of the mockup a name above, before you try another one."}
        </p>
      )}
      {drafts.data && itemsOf(drafts.data).length > 0 && (
        <ul aria-label="Drafts, the newest first" className="divide-y divide-rule border-y border-rule">
          {itemsOf(drafts.data).map((draft) => (
            <DraftItem
              key={draft.id}
              {...of}
              draft={draft}
              isLooking={looking === draft.id}
              onLook={() => setLooking(looking === draft.id ? null : draft.id)}
            />
          ))}
        </ul>
      )}
      <ShowMore query={drafts} what="drafts" />
    </div>
  );
}
