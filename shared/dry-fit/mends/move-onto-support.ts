import { measureSupport } from "../../bonds/support.ts";
import { boxOfRegion } from "../../geometry/box.ts";
import type { Box, Point } from "../../geometry/path.ts";
import { isShorter, lengthsEqual } from "../../geometry/tolerance.ts";
import { regionTransform, translateMatrix } from "../../geometry/transform.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { boardRegion } from "../../stack/piece-region.ts";
import { areasTouch, spreadOf } from "../../stack/touching.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import type { RuleInput } from "../rule.ts";
import { piecesBelow, supportOf } from "../under.ts";
import { layersWithFigures } from "../words.ts";

/** A little more than needed, so that rounding leaves nothing over the edge, mm. */
const spareMm = 0.1;

/**
 * Moves a piece that hangs over back onto one thing under it, straight along the board, when no more than the reach that
 * may hang over is needed for it.
 */
export function moveOntoSupport(finding: Finding, input: RuleInput): Mend[] {
  const found = layersWithFigures(input).find(({ layer }) => layer.key === finding.layerKey);
  const piece = found?.pieces.find((one) => one.piece.id === finding.pieceIds[0]);
  if (!found || !piece) return [];
  const { figures } = piece;
  const moves = thingsNear(found.level, figures, input)
    .map((box) => moveInto(figures.box, box))
    .filter((move) => move !== null)
    .filter(({ x, y }) => (x !== 0 || y !== 0) && !isShorter(input.limits.reachMm, Math.hypot(x, y)))
    .toSorted((a, b) => Math.hypot(a.x, a.y) - Math.hypot(b.x, b.y));
  const move = moves.find((one) => liesWell(found.level, figures, one, input));
  if (!move) return [];
  const label = `Move it ${formatFine(Math.hypot(move.x, move.y), input.context.unit)} onto its support`;
  return [{ label, steps: [{ kind: "move pieces", pieceIds: [piece.piece.id], dx: move.x, dy: move.y }] }];
}

/** Boxes of what the piece could lie on at its height: the board, and each piece below. */
function thingsNear(level: number, { bottom }: PieceFigures, input: RuleInput): Box[] {
  const { document, figures, kernel } = input;
  const boxes = piecesBelow(input, level)
    .filter(({ top, areaMm2 }) => areaMm2 > 0 && lengthsEqual(top.nominal, bottom.nominal))
    .map(({ box }) => box);
  const board = lengthsEqual(figures.backerTop.nominal, bottom.nominal)
    ? boxOfRegion(boardRegion(document.board, kernel))
    : null;
  return board ? [...boxes, board] : boxes;
}

/** The shortest move that brings a box into another with a little to spare; null when it is too large for it. */
function moveInto(inner: Box, outer: Box): Point | null {
  const along = (start: number, length: number, from: number, room: number): number | null => {
    if (length > room) return null;
    const spare = Math.min(spareMm, (room - length) / 2);
    if (start < from) return roundedUp(from + spare - start);
    if (start + length > from + room) return -roundedUp(start + length - from - room + spare);
    return 0;
  };
  const x = along(inner.x, inner.width, outer.x, outer.width);
  const y = along(inner.y, inner.height, outer.y, outer.height);
  return x === null || y === null ? null : { x, y };
}

/** To whole hundredths. */
const roundedUp = (mm: number): number => Math.ceil(mm * 100 - 1e-6) / 100;

/** Whether the piece lies well there: nothing higher is under it, and no more hangs over than may. */
function liesWell(level: number, figures: PieceFigures, move: Point, input: RuleInput): boolean {
  const { kernel, limits } = input;
  const region = regionTransform(figures.region, translateMatrix(move.x, move.y));
  const spread = spreadOf(region);
  if (!spread.box) return false;
  const higher = piecesBelow(input, level).filter(({ top }) => isShorter(figures.bottom.nominal, top.nominal));
  if (higher.some((other) => areasTouch(spread, other, kernel))) return false;
  const support = supportOf(input, level, { ...figures, box: spread.box });
  const { unsupportedShare, reachMm } = measureSupport(region, support, kernel);
  return reachMm !== null && unsupportedShare <= limits.unsupportedCaution && reachMm <= limits.reachMm;
}
