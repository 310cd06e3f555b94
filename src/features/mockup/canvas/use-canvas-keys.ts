import type { KeyboardEvent } from "react";
import type { Point } from "#shared/geometry/path.ts";
import { type DrawingView, type Size, viewMoved, viewScaled } from "@/lib/drawing-view.ts";
import { useDesk } from "../editor/desk-context.ts";
import { useArrowStep } from "../editor/use-arrow-step.ts";
import { shiftTimes } from "../model/arrow-steps.ts";
import { findHole } from "../model/chosen-box.ts";
import { whyHoleStays, whyIdle } from "../model/chosen-words.ts";
import { removeHole, setHole } from "../model/commands/holes.ts";
import { boxOfPieces, movePieces, removePieces } from "../model/commands/pieces.ts";
import type { Drag } from "../model/drag.ts";
import { chooseAllPieces, nothingChosen } from "../model/selection.ts";
import { viewOfBox } from "./view-of-board.ts";

type Looking = {
  readonly view: DrawingView;
  readonly fit: DrawingView;
  readonly room: Size | null;
  readonly onView: (view: DrawingView | null) => void;
  readonly drag: Drag | null;
  readonly onDrag: (drag: Drag | null) => void;
};

const lookStepPx = 48;
const stepFactor = 1.4;

const arrows = new Map<string, Point>([
  ["ArrowLeft", { x: -1, y: 0 }],
  ["ArrowRight", { x: 1, y: 0 }],
  ["ArrowUp", { x: 0, y: -1 }],
  ["ArrowDown", { x: 0, y: 1 }],
]);

/** What the keys do on the elevation: choose all, move and remove what is chosen, look closer and farther, let go. */
export function useCanvasKeys({ view, fit, room, onView, drag, onDrag }: Looking) {
  const { document, selection, unit, edit, choose, say, holesByHand, putHolesByHand } = useDesk();
  const [step] = useArrowStep(unit);
  const { holeId, pieceIds } = selection;
  const whyNot = holeId === null ? whyIdle(document, selection) : whyHoleStays(document, holeId);

  function nudge({ x, y }: Point, by: number) {
    const hole = holeId === null ? null : findHole(document, holeId);
    if (hole !== null && whyNot === null) {
      const to = { holeId: hole.id, x: hole.x + x * by, y: hole.y + y * by };
      edit({ label: "Move a hole", together: `nudge ${hole.id}`, change: (before) => setHole(before, to) });
    } else if (hole === null && pieceIds.length === 0)
      onView(viewMoved(view, { x: -x * lookStepPx, y: -y * lookStepPx }));
    else if (whyNot !== null) say(whyNot);
    else {
      const move = { pieceIds, dx: x * by, dy: y * by };
      edit({
        label: "Move pieces",
        together: `nudge ${pieceIds.join(" ")}`,
        change: (before) => movePieces(before, move),
      });
    }
  }

  function remove() {
    if (whyNot !== null) say(whyNot);
    else if (holeId !== null) edit({ label: "Remove a hole", change: (before) => removeHole(before, { holeId }) });
    else edit({ label: "Remove pieces", change: (before) => removePieces(before, { pieceIds }) });
  }

  function letGo() {
    if (drag !== null) onDrag(null);
    else if (holesByHand !== null) putHolesByHand(null);
    else choose(nothingChosen);
  }

  function lookAtChosen() {
    const box = boxOfPieces(document, pieceIds);
    if (box !== null && room !== null) onView(viewOfBox(box, fit, room));
  }

  return function handleKeyDown(event: KeyboardEvent) {
    if ((event.ctrlKey || event.metaKey) && !event.altKey && event.key.toLowerCase() === "a") {
      event.preventDefault();
      choose(chooseAllPieces(document));
      return;
    }
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    const middle = { x: (room?.width ?? 0) / 2, y: (room?.height ?? 0) / 2 };
    const arrow = arrows.get(event.key);
    if (arrow) {
      event.preventDefault();
      nudge(arrow, event.shiftKey ? step * shiftTimes : step);
    } else if (event.key === "+" || event.key === "=") onView(viewScaled(view, stepFactor, middle, fit));
    else if (event.key === "-") onView(viewScaled(view, 1 / stepFactor, middle, fit));
    else if (event.key === "0") onView(null);
    else if (event.key === "9") lookAtChosen();
    else if (event.key === "Delete" || event.key === "Backspace") remove();
    else if (event.key === "Escape") letGo();
  };
}
