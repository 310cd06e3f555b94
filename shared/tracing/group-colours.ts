import type { Picture, Rgb } from "./picture.ts";
import { nothing } from "./picture.ts";

/** A colour and the pixels that have it. */
export type ColourCount = { readonly colour: Rgb; readonly count: number };

/** Pixels less opaque than this are no colour; more than `opaque` counts as wholly so. */
const clear = 24;
const opaque = 232;

/**
 * The colours of the pixels that `take` marks with 1, most frequent first: a histogram of five bits a channel whose cells are grouped
 * with the nearest larger one within `within` of RGB. Each group's colour is the median of its pixels in each channel, so
 * that a picture without noise gives its colours exactly.
 */
export function groupColours({ data }: Picture, take: Uint8Array, within: number): ColourCount[] {
  const places = new Int32Array(1 << 20).fill(-1);
  const cells: { key: number; count: number; sums: [number, number, number, number] }[] = [];
  for (let pixel = 0; pixel < take.length; pixel++) {
    if (take[pixel] !== 1) continue;
    const key = keyAt(data, pixel * 4);
    let place = places[key] ?? -1;
    if (place < 0) {
      place = places[key] = cells.length;
      cells.push({ key, count: 0, sums: [0, 0, 0, 0] });
    }
    const cell = cells[place];
    if (!cell) continue;
    cell.count++;
    for (let channel = 0; channel < 4; channel++)
      cell.sums[channel] = (cell.sums[channel] ?? 0) + valueAt(data, pixel * 4, channel);
  }
  const groups: { centre: number[]; count: number }[] = [];
  const ordered = cells.toSorted((a, b) => b.count - a.count || a.key - b.key);
  for (const { key, count, sums } of ordered) {
    const middle = sums.map((sum) => sum / count);
    let nearest = -1;
    let least = within * within;
    for (const [index, group] of groups.entries()) {
      const away = group.centre.reduce((sum, value, channel) => sum + (value - (middle[channel] ?? 0)) ** 2, 0);
      if (away < least) [nearest, least] = [index, away];
    }
    if (nearest < 0) nearest = groups.push({ centre: middle, count: 0 }) - 1;
    const group = groups[nearest];
    if (group) group.count += count;
    places[key] = nearest;
  }
  const medians = groups.map(() => new Int32Array(4 * 256));
  for (let pixel = 0; pixel < take.length; pixel++) {
    if (take[pixel] !== 1) continue;
    const median = medians[places[keyAt(data, pixel * 4)] ?? -1];
    if (!median) continue;
    for (let channel = 0; channel < 4; channel++) {
      const slot = channel * 256 + valueAt(data, pixel * 4, channel);
      median[slot] = (median[slot] ?? 0) + 1;
    }
  }
  return groups
    .map(({ count }, index) => ({ colour: medianColour(medians[index] ?? new Int32Array(0), count), count }))
    .toSorted((a, b) => b.count - a.count);
}

/** A channel of a pixel; nothing where it is clear, so that transparent pixels are one colour whatever they hide. */
function valueAt(data: Picture["data"], at: number, channel: number): number {
  const alpha = data[at + 3] ?? 0;
  if (alpha < clear) return 0;
  if (channel < 3) return data[at + channel] ?? 0;
  return alpha > opaque ? 255 : alpha;
}

function keyAt(data: Picture["data"], at: number): number {
  let key = 0;
  for (let channel = 0; channel < 4; channel++) key = (key << 5) | (valueAt(data, at, channel) >> 3);
  return key;
}

function medianColour(counts: Int32Array, total: number): Rgb {
  const [red = 0, green = 0, blue = 0, alpha = 0] = [0, 1, 2, 3].map((channel) => {
    let seen = 0;
    for (let value = 0; value < 256; value++) {
      seen += counts[channel * 256 + value] ?? 0;
      if (2 * seen >= total) return value;
    }
    return 255;
  });
  return alpha === 0 ? nothing : { red, green, blue, alpha };
}
