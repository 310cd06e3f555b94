import { Jimp } from "jimp";
import type { Point } from "#shared/geometry/path.ts";
import { type KnownCamera, seenBy } from "./known-camera.ts";

type Rectangle = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };

/** What stands on the wall, mm right of and below the sheet's middle, drawn one over the other. */
const scene: readonly (Rectangle & { readonly colour: number })[] = [
  { x: -6000, y: -4000, width: 12_000, height: 5200, colour: 0xd9d2c3ff },
  { x: -6000, y: 1200, width: 12_000, height: 900, colour: 0x8b7c68ff },
  { x: -6000, y: 1100, width: 12_000, height: 100, colour: 0xf2efe8ff },
  { x: -1250, y: -850, width: 960, height: 2050, colour: 0xf2efe8ff },
  { x: -1190, y: -790, width: 840, height: 1990, colour: 0x5f4a38ff },
  { x: -450, y: 150, width: 40, height: 120, colour: 0xc9b37aff },
];

const cornersOf = ({ x, y, width, height }: Rectangle): Point[] => [
  { x, y },
  { x: x + width, y },
  { x: x + width, y: y + height },
  { x, y: y + height },
];

/** A wall with a door and a taped A4 sheet, photographed by a known camera: a JPEG. */
export async function photographWall(camera: KnownCamera): Promise<Uint8Array<ArrayBuffer>> {
  const picture = new Jimp({ width: camera.widthPx, height: camera.heightPx, color: 0xd9d2c3ff });
  const sheet = { x: -105, y: -148.5, width: 210, height: 297, colour: 0xfdfdfbff };
  for (const thing of [...scene, sheet]) {
    const corners = cornersOf(thing).map((corner) => seenBy(camera, corner));
    fill(picture.bitmap, corners, thing.colour);
  }
  return Uint8Array.from(await picture.getBuffer("image/jpeg", { quality: 90 }));
}

/** Fills a convex polygon line by line. */
function fill(
  bitmap: { width: number; height: number; data: Buffer },
  corners: readonly Point[],
  colour: number,
): void {
  const tops = corners.map(({ y }) => y);
  const first = Math.max(0, Math.ceil(Math.min(...tops) - 0.5));
  const last = Math.min(bitmap.height - 1, Math.floor(Math.max(...tops) - 0.5));
  for (let row = first; row <= last; row++) {
    const y = row + 0.5;
    const crossings = corners.flatMap((from, index) => {
      const to = corners[(index + 1) % corners.length] ?? from;
      return from.y > y === to.y > y ? [] : [from.x + ((y - from.y) / (to.y - from.y)) * (to.x - from.x)];
    });
    if (crossings.length < 2) continue;
    const left = Math.max(0, Math.ceil(Math.min(...crossings) - 0.5));
    const right = Math.min(bitmap.width - 1, Math.floor(Math.max(...crossings) - 0.5));
    for (let column = left; column <= right; column++)
      bitmap.data.writeUInt32BE(colour, (row * bitmap.width + column) * 4);
  }
}
