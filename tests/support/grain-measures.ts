import type { PNG } from "pngjs";
import { regionContains } from "#shared/geometry/contains.ts";
import type { Box, Point, Region } from "#shared/geometry/path.ts";

/** A face as CIELAB lightness, 0 to 100, by places in mm. */
export type Lightness = { readonly at: (x: number, y: number) => number; readonly cellMm: number };

/** From sRGB (IEC 61966-2-1) by relative luminance to L* (CIE 15). */
function lightnessOf(red: number, green: number, blue: number): number {
  const linear = (byte: number) => {
    const share = byte / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  };
  const luminance = 0.2126 * linear(red) + 0.7152 * linear(green) + 0.0722 * linear(blue);
  return luminance > 216 / 24389 ? 116 * Math.cbrt(luminance) - 16 : (luminance * 24389) / 27;
}

/** A picture of a face over `box`, read between its pixels. */
export function lightnessOfPicture(png: PNG, box: Box): Lightness {
  const values = new Float64Array(png.width * png.height);
  for (let index = 0; index < values.length; index += 1) {
    const [red = 0, green = 0, blue = 0] = png.data.subarray(index * 4, index * 4 + 3);
    values[index] = lightnessOf(red, green, blue);
  }
  const cellMm = box.width / png.width;
  const value = (column: number, row: number) => {
    const x = Math.min(png.width - 1, Math.max(0, column));
    const y = Math.min(png.height - 1, Math.max(0, row));
    return values[y * png.width + x] ?? 0;
  };
  const at = (x: number, y: number) => {
    const [column, row] = [(x - box.x) / cellMm - 0.5, ((y - box.y) * png.height) / box.height - 0.5];
    const [left, top] = [Math.floor(column), Math.floor(row)];
    const [across, down] = [column - left, row - top];
    const upper = value(left, top) * (1 - across) + value(left + 1, top) * across;
    const lower = value(left, top + 1) * (1 - across) + value(left + 1, top + 1) * across;
    return upper * (1 - down) + lower * down;
  };
  return { at, cellMm };
}

type Strip = { readonly region: Region; readonly axis: { readonly from: Point; readonly to: Point } };

/** Places every cell apart whose surroundings lie in a strip, so that no neighbour has a part in what is measured there. */
function placesWithin({ region }: Strip, step: number, clear: number): Point[] {
  const points = region.flat();
  const [left, right] = [Math.min(...points.map(({ x }) => x)), Math.max(...points.map(({ x }) => x))];
  const [top, bottom] = [Math.min(...points.map(({ y }) => y)), Math.max(...points.map(({ y }) => y))];
  const places: Point[] = [];
  for (let y = top; y < bottom; y += step) {
    for (let x = left; x < right; x += step) {
      const around = [-clear, 0, clear].every((dx) =>
        [-clear, 0, clear].every((dy) => regionContains(region, { x: x + dx, y: y + dy })),
      );
      if (around) places.push({ x, y });
    }
  }
  return places;
}

/** The mean lightness of a strip. */
export function meanLightness(face: Lightness, strip: Strip): number {
  const places = placesWithin(strip, 2 * face.cellMm, 2 * face.cellMm);
  return places.reduce((sum, { x, y }) => sum + face.at(x, y), 0) / places.length;
}

/**
 * Degrees between the way the grain runs in a strip and the strip's axis, 0 to 90. The grain's way is the direction in which lightness
 * changes least: the lesser eigenvector of the structure tensor, the mean of the gradient's outer product.
 */
export function grainOffAxis(face: Lightness, strip: Strip): number {
  const step = face.cellMm;
  let [xx, xy, yy] = [0, 0, 0];
  for (const { x, y } of placesWithin(strip, step, 3 * step)) {
    const dx = face.at(x + step, y) - face.at(x - step, y);
    const dy = face.at(x, y + step) - face.at(x, y - step);
    xx += dx * dx;
    xy += dx * dy;
    yy += dy * dy;
  }
  const steepest = 0.5 * Math.atan2(2 * xy, xx - yy);
  const { from, to } = strip.axis;
  const axis = Math.atan2(to.y - from.y, to.x - from.x);
  const off = Math.abs((((steepest + Math.PI / 2 - axis) * 180) / Math.PI) % 180);
  return Math.min(off, 180 - off);
}

/** The patch that two strips of grain have in common from the near ends of their axes: correlation, -1 to 1; null where they share too little. */
export function patchCorrelation(face: Lightness, one: Strip, other: Strip, widthMm: number): number | null {
  const pairs: [number, number][] = [];
  const place = ({ axis: { from, to } }: Strip, u: number, v: number): Point => {
    const length = Math.hypot(to.x - from.x, to.y - from.y);
    const [cos, sin] = [(to.x - from.x) / length, (to.y - from.y) / length];
    return { x: from.x + u * cos - v * sin, y: from.y + u * sin + v * cos };
  };
  const half = widthMm / 2 - 3;
  for (let u = 0; u < 400; u += face.cellMm) {
    for (let v = -half; v <= half; v += face.cellMm) {
      const [a, b] = [place(one, u, v), place(other, u, v)];
      if (!regionContains(one.region, a) || !regionContains(other.region, b)) continue;
      pairs.push([face.at(a.x, a.y), face.at(b.x, b.y)]);
    }
  }
  // About 20 mm of a slat: less says nothing.
  if (pairs.length * face.cellMm ** 2 < 20 * 2 * half) return null;
  const mean = (index: 0 | 1) => pairs.reduce((sum, pair) => sum + pair[index], 0) / pairs.length;
  const [meanA, meanB] = [mean(0), mean(1)];
  let [ab, aa, bb] = [0, 0, 0];
  for (const [a, b] of pairs) {
    ab += (a - meanA) * (b - meanB);
    aa += (a - meanA) ** 2;
    bb += (b - meanB) ** 2;
  }
  return ab / Math.sqrt(aa * bb);
}
