import { PNG } from "pngjs";
import type { Box } from "#shared/geometry/path.ts";

/** Channels that differ by no more than this are the same: smoothing of edges and images differs between programs. */
const channelStep = 8;

export type Difference = {
  /** Share of the pixels looked at that differ and whose eight neighbours all differ too. */
  readonly share: number;
  /** Those pixels in red, for eyes. */
  readonly png: PNG;
};

/**
 * How far two pictures of one size are from each other. A 3 by 3 erosion drops lines of one pixel, which is what a shift
 * of less than a pixel leaves behind. Pixels in `masked` boxes are not looked at.
 */
export function pictureDifference(one: PNG, other: PNG, masked: readonly Box[]): Difference {
  const { width, height } = one;
  if (other.width !== width || other.height !== height) {
    throw new Error(`${width} by ${height} pixels can't be compared with ${other.width} by ${other.height}.`);
  }
  const looked = new Uint8Array(width * height).fill(1);
  for (const box of masked) {
    for (let y = Math.max(0, Math.floor(box.y)); y < Math.min(height, box.y + box.height); y += 1) {
      looked.fill(
        0,
        y * width + Math.max(0, Math.floor(box.x)),
        y * width + Math.min(width, Math.ceil(box.x + box.width)),
      );
    }
  }
  const differs = Uint8Array.from(looked, (use, index) =>
    use &&
    [0, 1, 2].some(
      (channel) =>
        Math.abs((one.data[index * 4 + channel] ?? 0) - (other.data[index * 4 + channel] ?? 0)) > channelStep,
    )
      ? 1
      : 0,
  );
  const png = new PNG({ width, height });
  let count = 0;
  for (let y = 1; y < height - 1; y += 1) {
    for (let x = 1; x < width - 1; x += 1) {
      const around = [-1, 0, 1].every((dy) => [-1, 0, 1].every((dx) => differs[(y + dy) * width + x + dx] === 1));
      if (!around) continue;
      count += 1;
      png.data.set([255, 0, 0, 255], (y * width + x) * 4);
    }
  }
  return { share: count / looked.reduce((sum, use) => sum + use, 0), png };
}
