import { boxCentre } from "#shared/geometry/box.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { formatExact } from "#shared/units/format-exact.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { findHole } from "./chosen-box.ts";
import { boxOfPieces } from "./commands/pieces.ts";
import type { Selection } from "./selection.ts";

/** Where the chosen hole, or the middle of the chosen pieces, lies: "x 120.5, y 80"; null when nothing is chosen. */
export function placeWords(document: MockupDocument, { holeId, pieceIds }: Selection, unit: LengthUnit): string | null {
  const box = boxOfPieces(document, pieceIds);
  const at = holeId === null ? box && boxCentre(box) : findHole(document, holeId);
  return at && `x ${formatExact(at.x, unit)}, y ${formatExact(at.y, unit)}`;
}
