import type { Kernel } from "../geometry/kernel.ts";
import type { Path } from "../geometry/path.ts";
import { circlePath, rectanglePath } from "../geometry/shapes.ts";
import { nestSheets } from "../sheets/nest-sheets.ts";
import type { CuttingRules, SheetLayout, SheetPiece } from "../sheets/nesting.ts";
import { type CalculationGroup, worked } from "./calculation.ts";

const rectangle = (width: number, height: number): Path => rectanglePath({ x: 0, y: 0, width, height });

/** Widths and heights of instance N1, which fill a strip of 40 up to 40. */
const burkeN1: readonly (readonly [width: number, height: number])[] = [
  [7, 6],
  [7, 6],
  [40, 16],
  [5, 20],
  [24, 24],
  [7, 4],
  [4, 4],
  [7, 8],
  [4, 20],
  [5, 4],
];

const noRules: CuttingRules = { marginMm: 0, kerfMm: 0, spacingMm: 0, bed: null, leastOffcutMm: 100 };

const piece = (id: string, path: Path, quantity = 1): SheetPiece => ({
  id,
  name: id,
  path,
  quantity,
  turns: { kind: "steps", from: 0, every: 90 },
  mayMirror: false,
});

/** Sheets of one size, as many as it takes, filled without a search. */
function laid(
  pieces: readonly SheetPiece[],
  [width, height]: readonly [number, number],
  rules: CuttingRules,
  kernel: Kernel,
): SheetLayout {
  const stock = {
    id: "sheet",
    name: "Sheet",
    path: rectangle(width, height),
    quantity: null,
    grainTurn: 0,
    isOffcut: false,
  };
  const outcome = nestSheets({ pieces, stock: [stock], rules, seed: 1, effort: 0 }, {}, kernel);
  if (outcome.ok) return outcome.value;
  throw new Error(outcome.problems.map(({ words }) => words).join(" "));
}

export const sheetCalculations: CalculationGroup = {
  title: "Sheets",
  calculations: [
    {
      id: "sheet-rectangles",
      title: "Rectangles on a sheet",
      formula:
        "The lowest step of what lies takes the rectangle that fits it best; then orders are exchanged while a better layout is found.",
      source: {
        text: "E. K. Burke, G. Kendall, G. Whitwell, Operations Research 52(4), 655-671, 2004, instance N1",
        status: "published",
      },
      limits:
        "Six published instances of 10 to 25 rectangles come out at their optimum after a short search; otherwise it is the best found, without proof. The same request gives the same layout.",
      example: (kernel) => {
        const strip = 40;
        const pieces = burkeN1.map(([width, height], index) => piece(`${index}`, rectangle(width, height)));
        const { sheets } = laid(pieces, [200, strip], noRules, kernel);
        const box = sheets[0]?.usedBox;
        return worked(
          [
            ["Rectangles", pieces.length],
            ["Strip", strip, "mm"],
          ],
          [["Length of strip", box ? box.x + box.width : 0, "mm"]],
        );
      },
    },
    {
      id: "sheet-gaps",
      title: "Kerf, spacing and margin",
      formula:
        "Neighbours keep kerf + spacing between their outlines, and the margin to the sheet's edge. Of squares a on a sheet w by h: ⌊(w − 2 m + k)/(a + k)⌋ · ⌊(h − 2 m + k)/(a + k)⌋.",
      source: { text: "Geometry", status: "calculated" },
      limits:
        "Curves are taken up to 0.15 mm larger than they are, so that no gap is ever less; on sheets that are no rectangle the margin is at least half the gap.",
      example: (kernel) => {
        const side = 90;
        const rules = { ...noRules, marginMm: 5, kerfMm: 5 };
        const { sheets } = laid([piece("square", rectangle(side, side), 60)], [1000, 500], rules, kernel);
        return worked(
          [
            ["Squares of", side, "mm"],
            ["Sheet", "1000 × 500", "mm"],
            ["Margin", rules.marginMm, "mm"],
            ["Kerf", rules.kerfMm, "mm"],
          ],
          [["On one sheet", sheets[0]?.placements.length ?? 0]],
        );
      },
    },
    {
      id: "sheet-shapes",
      title: "Shapes on a sheet, and in the openings of others",
      formula:
        "Outlines grown by half the gap are laid on cells of the sheet, each where it ends first of all its turns; then some neighbours at a time are taken up and laid again, and what is better is kept. At the end pieces are slid together and every gap is checked on the true outlines.",
      source: {
        text: "G. Schrimpf and others, Journal of Computational Physics 159, 139-171, 2000, for the search; cells are our choice",
        status: "our choice",
      },
      limits:
        "The best found, without proof that there is no better. Three sets of 60 concave pieces took 20 to 26 % less sheet than their boxes. 16 turns of a piece that may be turned freely, fewer when there are more than 200 pieces.",
      example: (kernel) => {
        const [outer, opening, side] = [100, 60, 70];
        const ring = [...circlePath({ x: 0, y: 0 }, outer), ...circlePath({ x: 0, y: 0 }, opening)];
        const rules = { ...noRules, marginMm: 3, kerfMm: 3 };
        const pieces = [piece("ring", ring), piece("square", rectangle(side, side))];
        const { sheets } = laid(pieces, [206, 206], rules, kernel);
        return worked(
          [
            ["Ring, radii", `${outer} and ${opening}`, "mm"],
            ["Square of", side, "mm"],
            ["Sheet", "206 × 206", "mm"],
          ],
          [
            ["Sheets", sheets.length],
            ["Used", sheets[0]?.use ?? 0],
          ],
        );
      },
    },
    {
      id: "sheet-bed",
      title: "Sheets larger than the bed",
      formula:
        "A rectangular sheet is cut straight across in parts as long as the bed takes, a kerf apart, whichever way the bed gives fewer; other sheets are not used.",
      source: { text: "Geometry", status: "our choice" },
      limits: "Parts are cut at the bed's size, the rest is the last part. What is narrower than its margins is waste.",
      example: (kernel) => {
        const rules = { ...noRules, kerfMm: 3, bed: { widthMm: 610, heightMm: 420, larger: "split" } } as const;
        const { sheets } = laid([piece("badge", rectangle(100, 60))], [1220, 800], rules, kernel);
        return worked(
          [
            ["Sheet", "1220 × 800", "mm"],
            ["Bed", "610 × 420", "mm"],
            ["Kerf", rules.kerfMm, "mm"],
          ],
          [["Parts", sheets.length]],
        );
      },
    },
  ],
};
