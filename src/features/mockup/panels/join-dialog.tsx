import { useMemo } from "react";
import { placePath } from "#shared/geometry/placement.ts";
import { Dialog } from "@/components/ui/dialog.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { useShaped } from "../engine/use-shaped.ts";
import { chosenWords } from "../model/chosen-words.ts";
import { joinPieces } from "../model/commands/shape-pieces.ts";
import { chosenByLayer, namedOutline } from "../model/cut-choices.ts";
import { ShapeForm } from "./shape-form.tsx";
import { ShapePicture } from "./shape-picture.tsx";

type JoinDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** Makes one piece of pieces that touch. */
export function JoinDialog({ open, onOpenChange }: JoinDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      size="wide"
      title="Join pieces"
      description="Pieces that overlap or lie edge to edge become one, cut as one. They read together what each of them reads."
    >
      <JoinForm onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

function JoinForm({ onDone }: { readonly onDone: () => void }) {
  const { document, selection, edit } = useDesk();
  const pieces = useMemo(
    () => chosenByLayer(document, selection).flatMap((chosen) => chosen.pieces),
    [document, selection],
  );
  const { step, shown } = useShaped({ kind: "join", outlines: pieces.map(namedOutline) });
  const joined = shown?.kind === "join" ? shown.made : [];
  const taken = new Set(joined.flatMap(({ ids }) => ids));
  const alone = pieces.length - taken.size;

  function take() {
    const id = newId();
    edit({
      label: "Join pieces",
      change: (before) => joinPieces(before, { joined, id }),
      choose: () => ({
        layerKey: selection.layerKey,
        pieceIds: [
          ...joined.map((_, index) => `${id}-${index + 1}`),
          ...pieces.map((piece) => piece.id).filter((one) => !taken.has(one)),
        ],
        holeId: null,
      }),
    });
    onDone();
  }

  return (
    <ShapeForm
      step={step}
      isReady={joined.length > 0}
      action="Join them"
      onTake={take}
      onDone={onDone}
      picture={
        <ShapePicture
          title="The pieces as they would be joined"
          isStale={step === "working"}
          shapes={[
            ...pieces.map((piece) => ({ path: placePath(piece.path, piece.placement), look: "was" as const })),
            ...joined.map(({ shaped }) => ({
              path: placePath(shaped.path, shaped.placement),
              look: "made" as const,
            })),
          ]}
        />
      }
      words={
        step === "made" &&
        joinWords(
          joined.map(({ ids }) => ids.length),
          alone,
        )
      }
    >
      <p className="text-sm text-ink">
        <span className="font-semibold">{chosenWords(document, selection) ?? "Nothing is chosen"}</span>
      </p>
      <p className="text-sm text-graphite">
        Only pieces of one layer are joined, since they are cut from one sheet. Where pieces of one artwork were parted
        by their colours, move them into one layer first.
      </p>
    </ShapeForm>
  );
}

function joinWords(groups: readonly number[], alone: number): string {
  if (groups.length === 0)
    return "None of them touches another, so there is nothing to join. Move them together first.";
  const made = groups.map((count) => `${count} become one`).join(", ");
  return alone === 0
    ? `Of them ${made}.`
    : `Of them ${made}; ${counted(alone, "touches", "touch")} no other and stay as they are.`;
}
