import { regionCentroid } from "../../geometry/area.ts";
import { boxesOverlap } from "../../geometry/box.ts";
import { type Kernel, remembered } from "../../geometry/kernel.ts";
import type { Point, Region } from "../../geometry/path.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import type { Finding } from "../finding.ts";
import type { PieceWithFigures } from "../joints.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, piecesWords } from "../words.ts";

/** Rule 39: two pieces of one layer that would have to be in one place. */
export const inOnePlace: Rule = { number: 39, title: "Two in one place", check };

/** Pieces that meet along a border may lie over one another by this much, mm: outlines are fitted, and no saw is truer. */
const borderMm = 0.1;

/** Where two pieces lie over each other by more than a border's error; null where they do not. */
export function measureOverlap(
  a: Pick<PieceFigures, "region">,
  b: Pick<PieceFigures, "region">,
  kernel: Kernel,
): Point | null {
  return remembered(kernel, [a.region, b.region], "in one place", () => {
    const shared = kernel.intersect(a.region, b.region);
    const left: Region = shared.length === 0 ? [] : kernel.offset(shared, -borderMm / 2, "mitre");
    return left.length === 0 ? null : regionCentroid(left);
  });
}

function check(input: RuleInput): Finding[] {
  return layersWithFigures(input).flatMap(({ layer, pieces }): Finding[] => {
    const found = overlapping(pieces, input.kernel);
    const [first] = found;
    if (!first) return [];
    const ids = new Set(found.flatMap(({ ids: both }) => both));
    const over = pieces.filter(({ piece }) => ids.has(piece.id));
    return [
      foundBy(inOnePlace, {
        severity: "stop",
        text: `${piecesWords(layer, over)} lie over one another at one height: no sheet can be in two pieces. Join them, move one, or give one a layer of its own.`,
        layerKey: layer.key,
        pieceIds: over.map(({ piece }) => piece.id),
        where: first.where,
        value: over.length,
        limit: 0,
        source: "arithmetic",
      }),
    ];
  });
}

/** Pairs that share a place and a height. Sorted from the left, a piece is compared only with those that begin before it ends. */
function overlapping(
  pieces: readonly PieceWithFigures[],
  kernel: Kernel,
): { readonly ids: readonly [string, string]; readonly where: Point }[] {
  const fromLeft = pieces
    .filter(({ figures }) => figures.areaMm2 > 0)
    .toSorted((a, b) => a.figures.box.x - b.figures.box.x);
  const found: { ids: [string, string]; where: Point }[] = [];
  for (const [index, one] of fromLeft.entries()) {
    const right = one.figures.box.x + one.figures.box.width;
    for (const other of fromLeft.slice(index + 1)) {
      if (other.figures.box.x >= right) break;
      if (!boxesOverlap(one.figures.box, other.figures.box) || !shareHeight(one.figures, other.figures)) continue;
      const where = measureOverlap(one.figures, other.figures, kernel);
      if (where) found.push({ ids: [one.piece.id, other.piece.id], where });
    }
  }
  return found;
}

const shareHeight = (a: PieceFigures, b: PieceFigures): boolean =>
  a.bottom.nominal < b.top.nominal && b.bottom.nominal < a.top.nominal;
