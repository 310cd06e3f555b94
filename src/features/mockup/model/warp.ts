import type { WallPlane } from "#shared/drawing/on-wall.ts";
import type { Box } from "#shared/geometry/path.ts";
import type { Board, WallPhoto } from "#shared/mockup/document.ts";
import { type Homography, localScale, mapPoint, product, scaleBy, shiftBy } from "#shared/wall/homography.ts";
import { raisedPlane } from "#shared/wall/raised-plane.ts";
import type { WallReading } from "#shared/wall/read-wall-photo.ts";

/** How one plane of the sign is laid over the photo: `pxPerMm` sizes its element, `map` takes that element's px to the screen's. */
export type Warp = { readonly pxPerMm: number; readonly map: Homography };

type Place = {
  readonly reading: WallReading;
  readonly at: WallPhoto["at"];
  readonly board: Pick<Board, "width" | "height">;
  /** What the planes show, mm on the board. */
  readonly box: Box;
  /** Px of the screen to a px of the photo. */
  readonly shown: number;
};

/** What the planes show, on the wall: mm right of and below the sheet's middle. */
export function boxOnWall({ at, board, box }: Pick<Place, "at" | "board" | "box">): Box {
  return { ...box, x: box.x + at.x - board.width / 2, y: box.y + at.y - board.height / 2 };
}

/**
 * Where a plane of the sign is seen. Without a camera all lie on the wall. Null when part of it would be behind the
 * camera, or so near its line that it would fill the screen.
 */
export function warpOf(place: Place, { offWallMm }: Pick<WallPlane, "offWallMm">): Warp | null {
  const { reading, shown } = place;
  const wall = product(scaleBy(shown), reading.toPhoto);
  const plane = reading.camera
    ? product(scaleBy(shown), raisedPlane(reading.toPhoto, reading.camera, offWallMm))
    : wall;
  const { x, y, width, height } = boxOnWall(place);
  const ends = [
    { x, y },
    { x: x + width, y },
    { x, y: y + height },
    { x: x + width, y: y + height },
  ];
  const scales = ends.map((end) => localScale(plane, end));
  const seen = scales.filter((scale) => scale !== null);
  if (seen.length < ends.length) return null;
  const pxPerMm = Math.max(...seen);
  if (pxPerMm * Math.max(width, height) > mostElementPx) return null;
  return { pxPerMm, map: product(product(plane, shiftBy(x, y)), scaleBy(1 / pxPerMm)) };
}

/** A browser draws no larger element in one piece. */
const mostElementPx = 12_000;

/** A map of the plane as CSS writes it (CSS Transforms Level 2, section 5): column by column, with a z that nothing is done to. */
export function matrix3dOf([a, b, c, d, e, f, g, h, i]: Homography): string {
  const figures = [a, d, 0, g, b, e, 0, h, 0, 0, i, 0, c, f, 0, i].map((figure) => figure / i);
  return `matrix3d(${figures.map((figure) => (Math.abs(figure) < 1e-15 ? 0 : Number(figure.toPrecision(12)))).join(",")})`;
}

/** Where a place on the sign's board is seen on the screen; null behind the camera. */
export function seenAt({ pxPerMm, map }: Warp, box: Box, onBoard: { readonly x: number; readonly y: number }) {
  return mapPoint(map, { x: (onBoard.x - box.x) * pxPerMm, y: (onBoard.y - box.y) * pxPerMm });
}
