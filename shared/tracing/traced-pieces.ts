import type { ArtworkPiece, ImportedArtwork } from "../artwork/imported-artwork.ts";
import { artworkLimits } from "../artwork/limits.ts";
import { ArtworkRefused } from "../artwork/refusals.ts";
import { regionAreaMm2 } from "../geometry/area.ts";
import { boxOfPath } from "../geometry/box.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Path, Point } from "../geometry/path.ts";
import { flatteningToleranceMm } from "../geometry/tolerance.ts";
import { segmentMap } from "../geometry/transform.ts";

/**
 * Outlines in pixels as pieces in mm, by colour (most area first) and within a colour from top to bottom and left to right. Throws
 * ArtworkRefused when there are none, or more than anyone could cut.
 */
export function tracedPieces(
  outlines: readonly { readonly colour: string; readonly outline: Path }[],
  mmPerPx: number,
): Pick<ImportedArtwork, "pieces" | "colours"> {
  if (outlines.length > artworkLimits.pieces) throw new ArtworkRefused("picture.too-many-pieces");
  if (outlines.length === 0) throw new ArtworkRefused("picture.nothing-left");
  const groups = new Map<string, Omit<ArtworkPiece, "index">[]>();
  for (const { colour, outline } of outlines) {
    const path = inMm(outline, mmPerPx);
    const box = boxOfPath(path);
    if (!box) continue;
    const piece = {
      colour,
      path,
      box,
      areaMm2: regionAreaMm2(flattenPath(path, Math.min(flatteningToleranceMm, mmPerPx / 50))),
    };
    const group = groups.get(colour);
    if (group) group.push(piece);
    else groups.set(colour, [piece]);
  }
  const ordered = [...groups]
    .map(([colour, own]) => ({ colour, own, areaMm2: own.reduce((sum, { areaMm2 }) => sum + areaMm2, 0) }))
    .sort((a, b) => b.areaMm2 - a.areaMm2 || (a.colour < b.colour ? -1 : 1));
  return {
    colours: ordered.map(({ colour, own, areaMm2 }) => ({ colour, pieces: own.length, areaMm2 })),
    pieces: ordered
      .flatMap(({ own }) => own.toSorted((a, b) => a.box.y - b.box.y || a.box.x - b.box.x || b.areaMm2 - a.areaMm2))
      .map((piece, index) => ({ ...piece, index })),
  };
}

/** To the thousandth of a millimetre, or finer where pixels are. */
function inMm(path: Path, mmPerPx: number): Path {
  const decimals = Math.max(3, Math.min(9, 2 - Math.floor(Math.log10(mmPerPx))));
  const round = ({ x, y }: Point): Point => ({
    x: Number((x * mmPerPx).toFixed(decimals)),
    y: Number((y * mmPerPx).toFixed(decimals)),
  });
  return path.map(({ start, segments }) => ({
    start: round(start),
    segments: segments.map((segment) => segmentMap(segment, round)),
  }));
}
