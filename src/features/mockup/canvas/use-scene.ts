import { type RefObject, useEffect, useEffectEvent, useState } from "react";
import { type DrawingView, viewScaled } from "@/lib/drawing-view.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { addHole } from "../model/commands/holes.ts";
import type { Drag } from "../model/drag.ts";
import { holeAt, pieceAt } from "../model/piece-at.ts";
import { chooseAlso, chooseHole, chooseLayer, choosePiece, layerOfPiece, nothingChosen } from "../model/selection.ts";
import { type GestureHost, listenToCanvas, reachPx } from "./gestures.ts";
import type { Sweep } from "./marks.ts";
import { createScene, type Scene } from "./scene.ts";
import { usePieceDrag } from "./use-piece-drag.ts";
import { useSweep } from "./use-sweep.ts";

type Hand = {
  readonly onDrag: (drag: Drag | null) => void;
  readonly view: DrawingView;
  readonly fit: DrawingView;
  readonly onView: (view: DrawingView | null) => void;
  readonly spaceDown: RefObject<boolean>;
  /** Whether every drag looks around, as with the space bar down. */
  readonly looksAround: boolean;
  /** Told where the pointer is in the window, px; null when it has left. */
  readonly onPointer: GestureHost["pointer"];
};

/** A hole put down by hand lies on whole and half millimetres. */
const putStepMm = 0.5;

/**
 * A fabric scene in an element of the page, whose gestures choose and drag what is on the desk, null until it is there; and the box that a
 * hand draws on it.
 */
export function useScene(
  place: RefObject<HTMLElement | null>,
  { onDrag, view, fit, onView, spaceDown, looksAround, onPointer }: Hand,
): { readonly scene: Scene | null; readonly sweep: Sweep | null } {
  const { document, figures, selection, site, holesByHand, edit, choose } = useDesk();
  const [scene, setScene] = useState<Scene | null>(null);

  const pieces = usePieceDrag({ onDrag, scale: view.scale });
  const { drawn, ...sweeping } = useSweep();

  const touched: GestureHost["touched"] = (point) => {
    // A hole lies under its cap: it is taken hold of once its layer is chosen, before that the cap belongs to the piece.
    const holeId = holeAt(document, selection.layerKey, point);
    if (holeId !== null) return { kind: "hole", id: holeId };
    const pieceId = figures && pieceAt({ document, figures, reachMm: reachPx / view.scale }, point);
    return pieceId === null ? null : { kind: "piece", id: pieceId };
  };
  const press: GestureHost["press"] = (what, { more }) => {
    if (what === null) {
      if (!more) choose(nothingChosen);
    } else if (what.kind === "hole") choose(chooseHole(document, what.id));
    else {
      const layer = layerOfPiece(document, what.id);
      if (layer && more) choose(chooseAlso(document, selection, layer.key));
      else if (layer && !selection.pieceIds.includes(what.id)) choose(chooseLayer(document, layer.key));
    }
  };
  const put: GestureHost["put"] = ({ x, y }) => {
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
  };
  const zoom: GestureHost["zoom"] = (factor, about) => {
    // With the whole board in view, wheeling away is left to the page.
    if (factor < 1 && view.scale <= fit.scale * 1.001) return false;
    onView(viewScaled(view, factor, about, fit));
    return true;
  };

  // A gesture asks for what is true when the hand moves, not for what was when the scene began to listen.
  const host = useEffectEvent(
    (): GestureHost => ({
      ...pieces,
      ...sweeping,
      view: () => view,
      fit: () => fit,
      showView: onView,
      zoom,
      looksAround: () => looksAround || spaceDown.current,
      touched,
      press,
      put,
      pressTwice: (what) => {
        if (what.kind === "piece") choose(choosePiece(document, what.id));
      },
      pointer: onPointer,
    }),
  );

  useEffect(() => {
    if (place.current === null) return;
    const made = createScene(place.current);
    setScene(made);
    const stop = listenToCanvas(made.canvas, () => host());
    return () => {
      stop();
      setScene(null);
      void made.close();
    };
  }, [place]);

  return { scene, sweep: drawn };
}
