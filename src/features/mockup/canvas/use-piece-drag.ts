import { useRef } from "react";
import type { Box } from "#shared/geometry/path.ts";
import { useDesk } from "../editor/desk-context.ts";
import { type CatchGrounds, catchGroundsOf } from "../model/catch-grounds.ts";
import { catchGuides } from "../model/catch-guides.ts";
import { boxOfChosen, findHole } from "../model/chosen-box.ts";
import { catchingGridMm } from "../model/desk-aids.ts";
import { type Drag, documentOfDrag, labelOfDrag } from "../model/drag.ts";
import { moveMeasures } from "../model/move-measures.ts";
import { shiftsBetween } from "../model/shifts.ts";
import { type GestureHost, reachPx } from "./gestures.ts";

type Hand = {
  readonly onDrag: (drag: Drag | null) => void;
  /** What a mm is on the screen, px. */
  readonly scale: number;
};

/** What a hand took hold of, with all that it can catch: nothing of it changes before the hand lets go. */
type Held = { readonly pieceIds: readonly string[]; readonly box: Box; readonly grounds: CatchGrounds };

/** What dragging pieces and holes does: it is caught and measured on the way and becomes one edit when the hand lets go. */
export function usePieceDrag({ onDrag, scale }: Hand): Pick<GestureHost, "drag" | "drop" | "giveUp"> {
  const { document, figures, figuresOf, selection, aids, edit } = useDesk();
  const held = useRef<Held | null>(null);
  /** The newest drag: the hand may let go before it was shown. */
  const newest = useRef<Drag | null>(null);

  function hand(next: Drag | null) {
    newest.current = next;
    onDrag(next);
  }

  function takeHold(): Held | null {
    if (figures === null) return null;
    const locked = new Set(document.layers.flatMap((layer) => (layer.locked ? layer.pieces.map(({ id }) => id) : [])));
    const pieceIds = selection.pieceIds.filter((id) => !locked.has(id));
    const shifts = shiftsBetween(figuresOf, document);
    const box = boxOfChosen(figures, pieceIds, shifts);
    if (box === null) return null;
    const { marginMm } = aids;
    const grounds = { document, figures, shifts, movedIds: pieceIds, marginMm, gridMm: catchingGridMm(aids) };
    return { pieceIds, box, grounds: catchGroundsOf(grounds) };
  }

  const pull: GestureHost["drag"] = (what, by, { free }) => {
    if (what.kind === "hole") {
      const hole = findHole(document, what.id);
      if (hole) hand({ kind: "hole", holeId: hole.id, x: hole.x + by.dx, y: hole.y + by.dy });
      return;
    }
    held.current ??= takeHold();
    if (held.current === null) return;
    const { pieceIds, box, grounds } = held.current;
    const move = { box, ...by, reachMm: reachPx / scale };
    const { dx, dy, guides } = free ? { ...by, guides: [] } : catchGuides(move, grounds);
    const measures = moveMeasures({ ...box, x: box.x + dx, y: box.y + dy }, grounds);
    hand({ kind: "pieces", pieceIds, dx, dy, guides, measures });
  };
  const drop = () => {
    const dropped = newest.current;
    held.current = null;
    if (dropped !== null) edit({ label: labelOfDrag(dropped), change: (before) => documentOfDrag(before, dropped) });
    hand(null);
  };
  const giveUp = () => {
    held.current = null;
    hand(null);
  };
  return { drag: pull, drop, giveUp };
}
