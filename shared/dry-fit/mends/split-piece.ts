import { remembered } from "../../geometry/kernel.ts";
import type { MockupDocument, Piece } from "../../mockup/document.ts";
import type { Shaped } from "../../shaping/shaped.ts";
import { splitToBed } from "../../shaping/split-to-bed.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import type { RuleInput } from "../rule.ts";

/**
 * Splits a piece that is too large for the bed across its longer side in as few parts as go on it. What the seams leave apart
 * becomes pieces of their own. None where no split goes on the bed.
 */
export function splitPieceMends({ pieceIds }: Finding, input: RuleInput): Mend[] {
  const { document, kernel, limits } = input;
  const piece = document.layers.flatMap(({ pieces }) => pieces).find(({ id }) => id === pieceIds[0]);
  if (!piece) return [];
  const bed = { widthMm: limits.bedWidthMm, heightMm: limits.bedHeightMm };
  const { path, placement } = piece;
  const split = remembered(kernel, [path, placement], `split to ${bed.widthMm} ${bed.heightMm}`, () =>
    splitToBed({ path, placement }, bed, { seams: "across", count: null, shiftMm: 0 }, kernel),
  );
  if (!split?.parts.every(({ fits }) => fits)) return [];
  const ids = freeIds(piece.id, split.parts.length, document);
  const parts = split.parts.map(({ shaped }, index) => ({ id: ids[index] ?? piece.id, ...changeable(shaped) }));
  const label = parts.length === 2 ? "Split it in two" : `Split it, into ${parts.length} parts`;
  return [{ label, steps: [{ kind: "split piece", pieceId: piece.id, parts }] }];
}

/** Ids like a piece's own that nothing in the document has. */
function freeIds(id: string, count: number, { layers }: MockupDocument): string[] {
  const taken = new Set(
    layers.flatMap(({ pieces, hold }) =>
      [...pieces, ...(hold.kind === "standoff" ? hold.holes : [])].map((one) => one.id),
    ),
  );
  const free: string[] = [];
  for (let number = 1; free.length < count; number++) {
    const next = `${id.slice(0, 56)}-${number}`;
    if (!taken.has(next)) free.push(next);
  }
  return free;
}

const changeable = ({ path, placement }: Shaped): Pick<Piece, "path" | "placement"> => ({
  path: path.map(({ start, segments }) => ({ start, segments: [...segments] })),
  placement,
});
