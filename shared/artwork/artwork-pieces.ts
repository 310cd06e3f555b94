import { regionAreaMm2, regionPerimeterMm } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import { connectedPieces } from "../geometry/connected.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { pathOfRegion } from "../geometry/path-of-region.ts";
import type { ArtworkPiece, ImportedArtwork } from "./imported-artwork.ts";
import { type Layer, layerOf } from "./layer.ts";
import { artworkLimits } from "./limits.ts";
import { ArtworkRefused } from "./refusals.ts";
import { isOpaque, type Rgba, rgbaOver, rgbaToHex, white } from "./rgba.ts";
import { simplifyRing } from "./simplify-ring.ts";

/** Slimmer than this on the working plane, a piece is a crumb that edges lying side by side left behind. */
const slimmestMm = 0.02;
/** A quarter of the flattening tolerance. */
const simplifyToleranceMm = 0.005;

/**
 * The patches of a drawing as pieces in mm: translucent rests mixed with white, each connected area on its own, by colour
 * (most area first) and within a colour from top to bottom and left to right. `mmPerWork` leads from the working plane to
 * mm. Outlines are straight edges within 0.025 mm of the curves on the working plane, nearly collinear points removed.
 */
export function artworkPieces(
  kernel: Kernel,
  layer: Layer,
  mmPerWork: number,
): { readonly pieces: ArtworkPiece[]; readonly colours: ImportedArtwork["colours"]; readonly mixed: boolean } {
  const byColour = new Map<string, { colour: Rgba; regions: Region[] }>();
  let mixed = false;
  for (const patch of layer) {
    if (!isOpaque(patch.colour)) mixed = true;
    const colour = rgbaOver(patch.colour, white);
    const key = rgbaToHex(colour);
    const part = byColour.get(key);
    if (part) part.regions.push(patch.region);
    else byColour.set(key, { colour, regions: [patch.region] });
  }
  const decimals = decimalsFor(mmPerWork);
  const groups = layerOf(kernel, [...byColour.values()])
    .map(({ key, region }) => {
      const pieces = connectedPieces(region)
        .filter((piece) => !isCrumb(piece))
        .map((piece) => finishedPiece(piece, key, mmPerWork, decimals))
        .filter((piece) => piece !== null)
        .sort((a, b) => a.box.y - b.box.y || a.box.x - b.box.x || b.areaMm2 - a.areaMm2);
      return { colour: key, pieces, areaMm2: pieces.reduce((sum, { areaMm2 }) => sum + areaMm2, 0) };
    })
    .filter(({ pieces }) => pieces.length > 0)
    .sort((a, b) => b.areaMm2 - a.areaMm2 || (a.colour < b.colour ? -1 : 1));
  const pieces = groups.flatMap((group) => group.pieces).map((piece, index) => ({ ...piece, index }));
  if (pieces.length > artworkLimits.pieces) throw new ArtworkRefused("svg.too-many-pieces");
  const colours = groups.map(({ colour, pieces: own, areaMm2 }) => ({ colour, pieces: own.length, areaMm2 }));
  return { pieces, colours, mixed };
}

function finishedPiece(
  region: Region,
  colour: string,
  mmPerWork: number,
  decimals: number,
): Omit<ArtworkPiece, "index"> | null {
  const round = (value: number) => Number((value * mmPerWork).toFixed(decimals));
  const rings = region
    .filter((ring) => !isCrumb([ring]))
    .map((ring) => simplifyRing(ring, simplifyToleranceMm).map(({ x, y }) => ({ x: round(x), y: round(y) })));
  const box = boxOfRegion(rings);
  return box ? { colour, path: pathOfRegion(rings), box, areaMm2: regionAreaMm2(rings) } : null;
}

function isCrumb(region: Region): boolean {
  return 2 * regionAreaMm2(region) < slimmestMm * regionPerimeterMm(region);
}

/** Places after the point that keep a thousandth of a working mm: small drawings are scaled up later. */
function decimalsFor(mmPerWork: number): number {
  return Math.max(3, Math.min(9, 3 - Math.floor(Math.log10(mmPerWork))));
}
