import { useEffect, useMemo, useState } from "react";
import { stepsAbove } from "#shared/drawing/section.ts";
import type { Limits } from "#shared/dry-fit/limits.ts";
import type { DryFitContext } from "#shared/dry-fit/rule.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { signBox } from "#shared/stack/sign-box.ts";
import type { Size } from "@/lib/drawing-view.ts";
import { fitSign, marginsOf, paperScaleAt, usualMargins } from "../canvas/view-of-board.ts";
import { type Drag, documentOfDrag } from "../model/drag.ts";
import { isSame } from "../model/same.ts";
import { useEngine } from "./use-engine.ts";
import { usePaced } from "./use-paced.ts";

type Wanted = {
  readonly document: MockupDocument;
  readonly drag: Drag | null;
  readonly context: DryFitContext;
  readonly limits: Limits;
  /** The window of the elevation; null before it was measured. */
  readonly room: Size | null;
};

/** The size that a window is taken to have before it was measured, px. */
const usualRoom = { width: 1100, height: 520 };

/** Handing more than this to the worker for each move of a hand would keep the hand waiting: the figures follow it a few times a second. */
const manyNodes = 4000;
const paceMs = 250;

const nodesOf = ({ layers }: MockupDocument): number =>
  layers
    .flatMap(({ pieces }) => pieces.flatMap(({ path }) => path))
    .reduce((sum, ring) => sum + ring.segments.length, 0);

/** Figures, elevation and dry fit of the desk, and the view that shows the whole board with its dimensions. */
export function useDeskPicture({ document, drag, context, limits, room }: Wanted) {
  const [margins, setMargins] = useState(usualMargins);
  const { board, frame } = document;
  const sign = useMemo(() => signBox({ board, frame }), [board, frame]);
  const fit = useMemo(() => fitSign(sign, margins, room ?? usualRoom), [sign, margins, room]);
  const paperScale = paperScaleAt(fit.scale);
  const isLarge = useMemo(() => nodesOf(document) > manyNodes, [document]);
  const followed = usePaced(drag, { isPaced: drag !== null && isLarge, everyMs: paceMs });
  const wanted = useMemo(() => documentOfDrag(document, followed), [document, followed]);
  const what = followed === null ? "all" : "figures";
  const input = useMemo(
    () => ({ document: wanted, context, limits, paperScale, dimensions: true, what }) as const,
    [wanted, context, limits, paperScale, what],
  );
  const { drawn, figures, failure } = useEngine(room === null ? null : input);

  // The window follows the rows of dimensions, but never under a hand that is dragging.
  const isDragging = drag !== null;
  useEffect(() => {
    if (drawn === null || isDragging) return;
    const { document: of, paperScale: at } = drawn.input;
    const sectionRows = figures === null ? 0 : stepsAbove(figures.of, figures.figures).length;
    const next = marginsOf(drawn.elevation, signBox(of), { paperScale: at, sectionRows });
    setMargins((before) => (isSame(before, next) ? before : next));
  }, [drawn, figures, isDragging]);

  return { fit, drawn, figures, failure, isCurrent: drawn?.input === input };
}
