import { useMemo, useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { chosenWords } from "../model/chosen-words.ts";
import { idsOfCopy } from "../model/commands/add-copies.ts";
import { movableOf } from "../model/commands/piece-motion.ts";
import { startStepOff, steppedOff } from "../model/step-off-draft.ts";
import { StepOffFields } from "./step-off-fields.tsx";
import { StepOffPicture } from "./step-off-picture.tsx";

type StepOffDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** Steps what is chosen, or copies of it, off at equal distances, as dividers do. */
export function StepOffDialog({ open, onOpenChange }: StepOffDialogProps) {
  return (
    <Dialog open={open} onOpenChange={onOpenChange} size="wide" title="Step off">
      <StepOffForm onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

function StepOffForm({ onDone }: { readonly onDone: () => void }) {
  const { document, selection, site, edit } = useDesk();
  const { pieceIds } = selection;
  const [draft, setDraft] = useState(() => startStepOff(document, pieceIds));
  const [id] = useState(newId);
  const outcome = useMemo(
    () => steppedOff(document, draft, { pieceIds, id, site }),
    [document, draft, pieceIds, id, site],
  );
  const words = chosenWords(document, selection) ?? "Nothing is chosen";

  function step() {
    if (!outcome.ok) return;
    const movable = movableOf(document, pieceIds);
    const isCopying = draft.what === "copies";
    const count = draft.count ?? 0;
    const copies = Array.from({ length: count }, (_, copy) => idsOfCopy(id, copy, movable.length)).flat();
    edit({
      label: isCopying ? `Step off ${counted(count, "copy", "copies")}` : "Step off what is chosen",
      change: (before) => {
        const done = steppedOff(before, draft, { pieceIds, id, site });
        return done.ok ? done.document : before;
      },
      ...(isCopying && { choose: () => ({ ...selection, holeId: null, pieceIds: [...movable, ...copies] }) }),
    });
    onDone();
  }

  return (
    <form
      className="grid gap-6 sm:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]"
      onSubmit={(event) => {
        event.preventDefault();
        step();
      }}
    >
      <div className="space-y-3">
        <p className="text-sm text-ink">
          <span className="font-semibold">{words}</span>
        </p>
        <StepOffFields draft={draft} onChange={setDraft} />
      </div>
      <div className="flex flex-col gap-3">
        <StepOffPicture before={document} after={outcome.ok ? outcome.document : document} pieceIds={pieceIds} />
        <p role="status" className="min-h-6 text-sm text-graphite">
          {outcome.ok ? "" : outcome.why}
        </p>
        <div className="mt-auto flex flex-wrap justify-end gap-3">
          <Button onClick={onDone}>Cancel</Button>
          <Button type="submit" disabled={!outcome.ok}>
            Step off
          </Button>
        </div>
      </div>
    </form>
  );
}
