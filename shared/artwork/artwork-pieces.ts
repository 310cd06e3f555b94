import { regionAreaMm2, regionPerimeterMm } from "../geometry/area.ts";
import { boxOfPath } from "../geometry/box.ts";
import { connectedPieces } from "../geometry/connected.ts";
import { fitRing } from "../geometry/fit-ring.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Point, Region, Ring } from "../geometry/path.ts";
import { flatteningToleranceMm } from "../geometry/tolerance.ts";
import { segmentMap } from "../geometry/transform.ts";
import type { ArtworkPiece, ImportedArtwork } from "./imported-artwork.ts";
import { type Layer, layerOf } from "./layer.ts";
import { artworkLimits } from "./limits.ts";
import { ArtworkRefused } from "./refusals.ts";
import { isOpaque, type Rgba, rgbaOver, rgbaToHex, white } from "./rgba.ts";
import { simplifyRing } from "./simplify-ring.ts";

/** Slimmer than this on the working plane, a piece is a crumb that edges lying side by side left behind. */
const slimmestMm = 0.02;
/** A tenth of the flattening tolerance: takes out what the kernel's grid and cuts left on straight lines, and no curve. */
const simplifyToleranceMm = 0.002;
const fitToleranceMm = 0.03;

/**
 * The patches of a drawing as pieces in mm: translucent rests mixed with white, each connected area on its own, by colour
 * (most area first) and within a colour from top to bottom and left to right. `mmPerWork` leads from the working plane to
 * mm. Outlines are the flattened ones with curves fitted again, so that few numbers say them and they stay smooth when the piece
 * grows: within 0.05 mm of the drawn curves on the working plane.
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
  const round = ({ x, y }: Point): Point => ({
    x: Number((x * mmPerWork).toFixed(decimals)),
    y: Number((y * mmPerWork).toFixed(decimals)),
  });
  const path = region
    .filter((ring) => !isCrumb([ring]))
    .map((ring) => fitRing(simplifyRing(ring, simplifyToleranceMm), fitToleranceMm))
    .map(({ start, segments }): Ring => ({ start: round(start), segments: segments.map((s) => segmentMap(s, round)) }));
  const box = boxOfPath(path);
  return box
    ? { colour, path, box, areaMm2: regionAreaMm2(flattenPath(path, flatteningToleranceMm * mmPerWork)) }
    : null;
}

function isCrumb(region: Region): boolean {
  return 2 * regionAreaMm2(region) < slimmestMm * regionPerimeterMm(region);
}

/** Places after the point that keep a thousandth of a working mm: small drawings are scaled up later. */
function decimalsFor(mmPerWork: number): number {
  return Math.max(3, Math.min(9, 3 - Math.floor(Math.log10(mmPerWork))));
}
