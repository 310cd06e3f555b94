import type { Picture } from "./picture.ts";

/** The longer side of what is traced, at most: finer pixels add noise and time, and no shape that could be cut. */
export const longestTracedPx = 2000;

/**
 * The picture with its longer side no longer than `longestPx`: every new pixel is the mean of those it covers, each by the part
 * that is covered and by how opaque it is. The same picture when it is small enough.
 */
export function scaleDown(picture: Picture, longestPx: number = longestTracedPx): Picture {
  const factor = longestPx / Math.max(picture.width, picture.height);
  if (factor >= 1) return picture;
  const width = Math.max(1, Math.round(picture.width * factor));
  const height = Math.max(1, Math.round(picture.height * factor));
  const data = new Uint8Array(width * height * 4);
  const columns = partsOf(picture.width, width);
  const rows = partsOf(picture.height, height);
  for (const [y, rowParts] of rows.entries())
    for (const [x, columnParts] of columns.entries()) mean(picture, rowParts, columnParts, data, (y * width + x) * 4);
  return { width, height, data };
}

type Part = { readonly at: number; readonly part: number };

/** For each new row or column the old ones it covers, and how much of each. */
function partsOf(old: number, now: number): Part[][] {
  const step = old / now;
  return Array.from({ length: now }, (_, index) => {
    const from = index * step;
    const to = Math.min(old, (index + 1) * step);
    const parts: Part[] = [];
    for (let at = Math.floor(from); at < to; at++) parts.push({ at, part: Math.min(at + 1, to) - Math.max(at, from) });
    return parts;
  });
}

function mean(
  { width, data }: Picture,
  rows: readonly Part[],
  columns: readonly Part[],
  out: Uint8Array,
  to: number,
): void {
  let [red, green, blue, alpha, all] = [0, 0, 0, 0, 0];
  for (const row of rows) {
    for (const column of columns) {
      const at = (row.at * width + column.at) * 4;
      const part = row.part * column.part;
      const opaque = part * (data[at + 3] ?? 0);
      red += opaque * (data[at] ?? 0);
      green += opaque * (data[at + 1] ?? 0);
      blue += opaque * (data[at + 2] ?? 0);
      alpha += opaque;
      all += part;
    }
  }
  if (alpha === 0) return;
  out[to] = Math.round(red / alpha);
  out[to + 1] = Math.round(green / alpha);
  out[to + 2] = Math.round(blue / alpha);
  out[to + 3] = Math.round(alpha / all);
}
