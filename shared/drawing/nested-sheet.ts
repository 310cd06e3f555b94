import { boxOfRegion } from "../geometry/box.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Point, Region } from "../geometry/path.ts";
import { pathOfRegion } from "../geometry/path-of-region.ts";
import { placementMatrix } from "../geometry/placement.ts";
import { matrixMultiply, pathTransform, regionTransform, translateMatrix } from "../geometry/transform.ts";
import type { NestedSheet, SheetPiece } from "../sheets/nesting.ts";
import { formatSize } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { fineLineMm } from "./dimensions.ts";
import type { Item } from "./display-list.ts";
import { labelRoom } from "./label-room.ts";
import { graphite, ink, linen, rule, sheetWhite } from "./palette.ts";
import { textItem } from "./text-item.ts";
import { capHeightShare, smallTextMm, textWidthMm } from "./type.ts";

export type SheetPicture = {
  readonly sheet: NestedSheet;
  readonly pieces: ReadonlyMap<string, SheetPiece>;
  /** Millimetres of sheet that make one on paper. */
  readonly scale: number;
  /** Upper left corner of the sheet's box on paper. */
  readonly at: Point;
  readonly unit: LengthUnit;
};

/**
 * One sheet with the pieces in their places under their names, and what is left for another job dashed and hatched, with its size.
 * Everything to scale; a name stands only where it has room.
 */
export function drawNestedSheet({ sheet, pieces, scale, at, unit }: SheetPicture): Item[] {
  const box = boxOfRegion(sheet.region) ?? { x: 0, y: 0, width: 0, height: 0 };
  const onPaper = matrixMultiply(translateMatrix(at.x, at.y), {
    a: 1 / scale,
    b: 0,
    c: 0,
    d: 1 / scale,
    e: -box.x / scale,
    f: -box.y / scale,
  });
  const outline = pathOfRegion(regionTransform(sheet.region, onPaper));
  return [
    { kind: "path", path: outline, fill: sheetWhite },
    ...sheet.offcuts.flatMap((offcut) => offcutItems(regionTransform(offcut, onPaper), sizeWords(offcut, unit))),
    ...sheet.placements.flatMap((placement): Item[] => {
      const piece = pieces.get(placement.pieceId);
      if (!piece) return [];
      const path = pathTransform(piece.path, matrixMultiply(onPaper, placementMatrix({ ...placement, scale: 1 })));
      const stroke = { colour: ink, widthMm: fineLineMm };
      const id = `piece:${piece.id}`;
      return [{ kind: "path", id, path, fill: linen, stroke }, ...label(piece.name, flattenPath(path), ink)];
    }),
    { kind: "path", path: outline, stroke: { colour: graphite, widthMm: fineLineMm } },
  ];
}

function offcutItems(region: Region, words: string): Item[] {
  const stroke = { colour: graphite, widthMm: fineLineMm, dashMm: [2, 1.2] };
  return [
    { kind: "clip", clip: pathOfRegion(region), items: hatching(region) },
    { kind: "path", path: pathOfRegion(region), stroke },
    ...label(words, region, graphite),
  ];
}

/** Distance of hatching lines along the paper's edges, mm. */
const hatchMm = 4;

/** Lines at 45 degrees over the box of a region, on one lattice for the whole paper. */
function hatching(region: Region): Item[] {
  const box = boxOfRegion(region);
  if (!box) return [];
  const stroke = { colour: rule, widthMm: fineLineMm };
  const first = Math.ceil((box.x + box.y) / hatchMm);
  const last = Math.floor((box.x + box.width + box.y + box.height) / hatchMm);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index): Item => {
    const sum = (first + index) * hatchMm;
    const points = [
      { x: sum - box.y, y: box.y },
      { x: sum - box.y - box.height, y: box.y + box.height },
    ];
    return { kind: "line", points, stroke };
  });
}

function sizeWords(region: Region, unit: LengthUnit): string {
  const box = boxOfRegion(region);
  return box ? `left ${formatSize(box.width, box.height, unit)}` : "";
}

/** Clear of what stands beside it, mm on paper. */
const besideTextMm = 1;

function label(text: string, region: Region, colour: string): Item[] {
  const font = "sans-semibold";
  const capMm = smallTextMm * capHeightShare;
  const at = labelRoom(region, textWidthMm(text, font, smallTextMm) + besideTextMm, capMm + besideTextMm);
  if (!at || text === "") return [];
  return [textItem(text, { x: at.x, y: at.y + capMm / 2 }, { font, colour, align: "middle" })];
}
