import { type RefObject, useEffect, useEffectEvent, useState } from "react";
import { type DrawingView, viewScaled } from "@/lib/drawing-view.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { catchGuides } from "../model/catch-guides.ts";
import { boxesToLineUpWith, boxOfChosen, findHole } from "../model/chosen-box.ts";
import { addHole } from "../model/commands/holes.ts";
import { type Drag, documentOfDrag, labelOfDrag } from "../model/drag.ts";
import { holeAt, pieceAt } from "../model/piece-at.ts";
import { chooseAlso, chooseHole, chooseLayer, choosePiece, layerOfPiece, nothingChosen } from "../model/selection.ts";
import { shiftsBetween } from "../model/shifts.ts";
import { type GestureHost, listenToCanvas } from "./gestures.ts";
import { createScene, type Scene } from "./scene.ts";

type Hand = {
  readonly drag: Drag | null;
  readonly onDrag: (drag: Drag | null) => void;
  readonly view: DrawingView;
  readonly fit: DrawingView;
  readonly onView: (view: DrawingView | null) => void;
  readonly spaceDown: RefObject<boolean>;
};

/** How near a finger must come to an outline, and a moved edge to a line, px. */
const reachPx = 6;
/** A hole put down by hand lies on whole and half millimetres. */
const putStepMm = 0.5;

/** A fabric scene in an element of the page, whose gestures choose and drag what is on the desk; null until it is there. */
export function useScene(
  place: RefObject<HTMLElement | null>,
  { drag, onDrag, view, fit, onView, spaceDown }: Hand,
): Scene | null {
  const { document, figures, figuresOf, selection, site, holesByHand, edit, choose } = useDesk();
  const [scene, setScene] = useState<Scene | null>(null);

  // A gesture asks for what is true when the hand moves, not for what was when the scene began to listen.
  const touched = useEffectEvent<GestureHost["touched"]>((point) => {
    // A hole lies under its cap: it is taken hold of once its layer is chosen, before that the cap belongs to the piece.
    const holeId = holeAt(document, selection.layerKey, point);
    if (holeId !== null) return { kind: "hole", id: holeId };
    const pieceId = figures && pieceAt({ document, figures, reachMm: reachPx / view.scale }, point);
    return pieceId === null ? null : { kind: "piece", id: pieceId };
  });
  const press = useEffectEvent<GestureHost["press"]>((what, { more }) => {
    if (what === null) choose(nothingChosen);
    else if (what.kind === "hole") choose(chooseHole(document, what.id));
    else {
      const layer = layerOfPiece(document, what.id);
      if (layer && more) choose(chooseAlso(document, selection, layer.key));
      else if (layer && !selection.pieceIds.includes(what.id)) choose(chooseLayer(document, layer.key));
    }
  });
  const put = useEffectEvent<GestureHost["put"]>(({ x, y }) => {
    const key = holesByHand;
    if (key === null) return false;
    const id = newId();
    const at = { x: Math.round(x / putStepMm) * putStepMm, y: Math.round(y / putStepMm) * putStepMm };
    edit({
      label: `Add a hole to ${key}`,
      change: (before) => addHole(before, { key, id, site, ...at }),
      choose: (after) => chooseHole(after, id),
    });
    return true;
  });
  const pressTwice = useEffectEvent<GestureHost["pressTwice"]>((what) => {
    if (what.kind === "piece") choose(choosePiece(document, what.id));
  });
  const pull = useEffectEvent<GestureHost["drag"]>((what, by, { free }) => {
    if (what.kind === "hole") {
      const hole = findHole(document, what.id);
      if (hole) onDrag({ kind: "hole", holeId: hole.id, x: hole.x + by.dx, y: hole.y + by.dy });
      return;
    }
    const { pieceIds } = selection;
    const box = figures && boxOfChosen(figures, pieceIds, shiftsBetween(figuresOf, document));
    if (!box || !figures) return;
    const { width, height } = document.board;
    const others = free ? [] : [{ x: 0, y: 0, width, height }, ...boxesToLineUpWith(figures, pieceIds)];
    onDrag({ kind: "pieces", pieceIds, ...catchGuides({ box, ...by, reachMm: reachPx / view.scale }, others) });
  });
  const drop = useEffectEvent(() => {
    if (drag === null) return;
    edit({ label: labelOfDrag(drag), change: (before) => documentOfDrag(before, drag) });
    onDrag(null);
  });
  const giveUp = useEffectEvent(() => onDrag(null));
  const views = useEffectEvent(() => ({ view, fit }));
  const showView = useEffectEvent((next: DrawingView) => onView(next));
  const zoom = useEffectEvent<GestureHost["zoom"]>((factor, about) => {
    // With the whole board in view, wheeling away is left to the page.
    if (factor < 1 && view.scale <= fit.scale * 1.001) return false;
    onView(viewScaled(view, factor, about, fit));
    return true;
  });

  useEffect(() => {
    if (place.current === null) return;
    const made = createScene(place.current);
    setScene(made);
    const stop = listenToCanvas(made.canvas, {
      view: () => views().view,
      fit: () => views().fit,
      showView: (next) => showView(next),
      zoom: (factor, about) => zoom(factor, about),
      spaceDown: () => spaceDown.current,
      touched: (point) => touched(point),
      press: (what, held) => press(what, held),
      put: (point) => put(point),
      pressTwice: (what) => pressTwice(what),
      drag: (what, by, held) => pull(what, by, held),
      drop: () => drop(),
      giveUp: () => giveUp(),
    });
    return () => {
      stop();
      setScene(null);
      void made.close();
    };
  }, [place, spaceDown]);

  return scene;
}
