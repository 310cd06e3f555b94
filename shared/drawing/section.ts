import { lengthsEqual } from "../geometry/tolerance.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import { signBox } from "../stack/sign-box.ts";
import { formatLength } from "../units/format-length.ts";
import { dimensionRowMm, drawDimensions } from "./dimensions.ts";
import type { DisplayList } from "./display-list.ts";
import { boardPlaneId } from "./elevation.ts";
import { placedStandoffs } from "./hardware.ts";
import { sheetWhite } from "./palette.ts";
import { drawBacker, drawFrame } from "./section-backer.ts";
import { drawSlabs, drawStandoffs, drawWall, type SectionInput, slabsOf, wallHatchMm } from "./section-bodies.ts";
import { layLabels } from "./section-labels.ts";
import { smallTextMm, textWidthMm } from "./type.ts";

/** A depth that is dimensioned, mm from the back of the board. */
type Step = { readonly from: number; readonly to: number };

/** What is dimensioned above the section, a row each: the backer, and every height that barrels stand. */
export function stepsAbove(document: MockupDocument, figures: Figures): Step[] {
  const steps: Step[] = [{ from: 0, to: figures.backerTop.nominal }];
  for (const { barrel } of placedStandoffs(document, figures)) {
    const isNew = steps.every(({ from, to }) => !lengthsEqual(from, barrel.from) || !lengthsEqual(to, barrel.to));
    if (barrel.to > barrel.from && isNew) steps.push({ from: barrel.from, to: barrel.to });
  }
  return steps;
}

/**
 * The stack from the side, wall at the left and viewer at the right: every layer at its height above the back of the board, with its
 * key and its top; depths dimensioned above and below. The board's height is at the elevation's scale.
 */
export function drawSection(input: SectionInput): DisplayList {
  const { document, figures, unit, paperScale, depthScale } = input;
  const mm = (paper: number) => paper * paperScale;
  const whole = signBox(document);
  const lowest = whole.y + whole.height;
  const standoffs = placedStandoffs(document, figures);
  const slabs = slabsOf(input);
  const metal = drawStandoffs(standoffs, input);
  const deepest = figures.depth.nominal;
  const depthText = (mmDeep: number) => formatLength(mmDeep, unit);
  const above = stepsAbove(document, figures).map((step) => ({ ...step, thing: whole.y }));
  const below = [
    ...(document.hanging.gap > 0 ? [{ from: -document.hanging.gap, to: 0, thing: lowest + mm(4) }] : []),
    { from: -document.hanging.gap, to: deepest, thing: lowest + mm(4) },
  ];
  const labels = layLabels(input, slabs);
  // Lettering stands to the right of these short steps: whatever ends farther right goes in the nearer row, clear of it.
  const byReach = (a: { to: number }, b: { to: number }) => b.to - a.to;
  const under = Math.max(lowest + mm(4), labels.bottom);
  const dimensions = [
    ...above.sort(byReach).map((step, index) => ({ ...step, at: whole.y - mm(dimensionRowMm * (index + 1)) })),
    ...below.sort(byReach).map((step, index) => ({ ...step, at: under + mm(dimensionRowMm * (index + 1)) })),
  ].map(({ from, to, at, thing }) => ({
    axis: "x" as const,
    from: from * depthScale,
    to: to * depthScale,
    at,
    thing,
    text: depthText(to - from),
    overflow: "after" as const,
  }));
  const items = [
    ...drawWall(input),
    ...drawFrame(input),
    ...drawBacker(input),
    ...metal.inWood,
    ...metal.barrels,
    ...drawSlabs(slabs, paperScale),
    ...metal.caps,
    drawDimensions(dimensions, { id: "dimension:depth", paperScale, ground: sheetWhite }),
    ...labels.items,
  ];
  const widest = Math.max(
    labels.right,
    ...dimensions.map(({ to, text }) => to + mm(textWidthMm(text, "serif", smallTextMm) + 7)),
  );
  const left = document.hanging.gap * depthScale + mm(wallHatchMm + 4.2);
  const top = mm(Math.max(dimensionRowMm * above.length + 5, 8)) - whole.y;
  const bottom = under + mm(dimensionRowMm * below.length + 2.5);
  return {
    widthMm: left + widest,
    heightMm: top + bottom,
    items: [{ kind: "group", id: boardPlaneId, x: left, y: top, scale: 1, items }],
  };
}
