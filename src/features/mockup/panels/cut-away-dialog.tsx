import { useMemo, useState } from "react";
import { placePath } from "#shared/geometry/placement.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { CutPiece } from "#shared/shaping/cut-away.ts";
import { formatArea } from "#shared/units/format-area.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Dialog } from "@/components/ui/dialog.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { useShaped } from "../engine/use-shaped.ts";
import { cutAwayPieces } from "../model/commands/shape-pieces.ts";
import { cutTargets, cutTools, namedOutline, piecesById } from "../model/cut-choices.ts";
import { boundsProblem, isWithinBounds } from "../model/length-bounds.ts";
import { ShapeForm } from "./shape-form.tsx";
import { ShapePicture } from "./shape-picture.tsx";

type CutAwayDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** Cuts the shape of pieces out of others. */
export function CutAwayDialog({ open, onOpenChange }: CutAwayDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      size="wide"
      title="Cut away"
      description="The shape of some pieces is cut right through others, with room all round if you like."
    >
      <CutAwayForm onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

const roomBounds = { least: 0, most: 100 };

function CutAwayForm({ onDone }: { readonly onDone: () => void }) {
  const { document, selection, unit, edit } = useDesk();
  const targets = useMemo(() => cutTargets(document, selection), [document, selection]);
  const [targetId, setTarget] = useState<string | null>(null);
  const target = targets.find(({ id }) => id === targetId) ?? targets[0] ?? { id: "", title: "", pieceIds: [] };
  const tools = useMemo(() => cutTools(document, selection, target), [document, selection, target]);
  const [toolId, setTool] = useState<string | null>(null);
  const tool = tools.find(({ id }) => id === toolId) ?? tools[0];
  const [roomMm, setRoom] = useState<number | null>(0);
  const [useUp, setUseUp] = useState(false);
  const isLocked = isAnyLocked(document, tool?.pieceIds ?? []);
  const isRight = isWithinBounds(roomMm, roomBounds);
  const pieces = useMemo(() => piecesById(document, target.pieceIds), [document, target]);
  const by = useMemo(() => piecesById(document, tool?.pieceIds ?? []), [document, tool]);
  const { step, shown } = useShaped(
    isRight && tool ? { kind: "cut away", outlines: pieces.map(namedOutline), by: by.map(namedOutline), roomMm } : null,
  );
  const cut = shown?.kind === "cut away" ? shown.made : [];
  const changed = new Set(cut.map(({ id }) => id));

  function take() {
    if (!tool) return;
    const id = newId();
    edit({
      label: "Cut away",
      change: (before) => cutAwayPieces(before, { cut, by: tool.pieceIds, useUp: useUp && !isLocked, id }),
    });
    onDone();
  }

  if (!tool) return <p className="text-base text-graphite">There is nothing else on the board to cut it with.</p>;
  return (
    <ShapeForm
      step={step}
      isReady={cut.length > 0}
      action="Cut it away"
      onTake={take}
      onDone={onDone}
      picture={
        <ShapePicture
          title="What would be left"
          isStale={step === "working"}
          shapes={[
            ...pieces
              .filter(({ id }) => !changed.has(id))
              .map((piece) => ({ path: placePath(piece.path, piece.placement), look: "made" as const })),
            ...pieces
              .filter(({ id }) => changed.has(id))
              .map((piece) => ({ path: placePath(piece.path, piece.placement), look: "was" as const })),
            ...cut.flatMap(({ left }) =>
              left.map((part) => ({ path: placePath(part.path, part.placement), look: "made" as const })),
            ),
            ...by.map((piece) => ({ path: placePath(piece.path, piece.placement), look: "tool" as const })),
          ]}
        />
      }
      words={step === "made" && cutWords(cut, unit)}
    >
      <Select label="Cut out of" value={target.id} onChange={(event) => setTarget(event.target.value)}>
        {targets.map(({ id, title }) => (
          <option key={id} value={id}>
            {title}
          </option>
        ))}
      </Select>
      <Select label="The shape of" value={tool.id} onChange={(event) => setTool(event.target.value)}>
        {tools.map(({ id, title }) => (
          <option key={id} value={id}>
            {title}
          </option>
        ))}
      </Select>
      <LengthField
        fine
        label="Room all round"
        hint="How much larger than the shape the opening is, at each side."
        unit={unit}
        value={roomMm}
        onChange={setRoom}
        error={boundsProblem(roomMm, roomBounds, unit)}
      />
      <Select
        label="What was cut with"
        {...(isLocked ? { hint: "Some of it is locked, so it stays." } : {})}
        disabled={isLocked}
        value={useUp && !isLocked ? "used up" : "stays"}
        onChange={(event) => setUseUp(event.target.value === "used up")}
      >
        <option value="stays">stays on the board</option>
        <option value="used up">is taken off</option>
      </Select>
    </ShapeForm>
  );
}

function isAnyLocked({ layers }: MockupDocument, pieceIds: readonly string[]): boolean {
  const wanted = new Set(pieceIds);
  return layers.some(({ locked, pieces }) => locked && pieces.some(({ id }) => wanted.has(id)));
}

function cutWords(cut: readonly CutPiece[], unit: LengthUnit): string {
  if (cut.length === 0) return "The shape does not lie over what it shall be cut out of, so nothing would change.";
  const taken = cut.reduce((sum, { takenMm2 }) => sum + takenMm2, 0);
  const apart = cut.filter(({ left }) => left.length > 1);
  const gone = cut.filter(({ left }) => left.length === 0).length;
  return [
    `${counted(cut.length, "piece loses", "pieces lose")} ${formatArea(taken, unit)}${cut.length > 1 ? " together" : ""}.`,
    ...apart
      .slice(0, 1)
      .map(({ left }) =>
        apart.length === 1 ? `It comes apart in ${left.length}.` : `${apart.length} of them come apart.`,
      ),
    ...(gone > 0 ? [`Of ${counted(gone, "piece")} nothing is left.`] : []),
  ].join(" ");
}
