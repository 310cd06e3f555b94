import { useQuery } from "@tanstack/react-query";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { draftQueries } from "../api/draft-requests.ts";
import { ChangeList } from "./change-list.tsx";
import { DocumentPicture } from "./document-picture.tsx";
import type { DraftsOf } from "./drafts-dialog.tsx";

type DraftLookProps = DraftsOf & { readonly draftId: string; readonly name: string };

/** A draft as a picture, and in words what going back to it changes. */
export function DraftLook({ draftId, name, document, unit, onGoBack, ...of }: DraftLookProps) {
  const draft = useQuery(draftQueries.one(of, draftId));
  if (draft.isPending) return <Skeleton label="Loading the draft" rows={2} />;
  if (draft.isError)
    return (
      <ProblemNotice what="The draft could not be loaded." error={draft.error} onRetry={() => void draft.refetch()} />
    );
  return (
    <div className="grid gap-4 md:grid-cols-[minmax(0,1fr)_minmax(0,18rem)]">
      <DocumentPicture document={draft.data.document} unit={unit} title={`The draft “${name}”, from the front`} />
      <ChangeList
        before={document}
        after={draft.data.document}
        unit={unit}
        title={onGoBack ? "Going back to it changes" : "What it has otherwise than the mockup now"}
      />
    </div>
  );
}
