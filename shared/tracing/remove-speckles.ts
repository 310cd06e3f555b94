import { artworkLimits } from "../artwork/limits.ts";
import { ArtworkRefused } from "../artwork/refusals.ts";
import type { Labels } from "./label-pixels.ts";
import { pixelAreas } from "./pixel-areas.ts";

/** Taking one speckle out joins what lay around it, which may leave another to be taken. */
const mostRounds = 4;

/**
 * The labels with every area of fewer than `leastPixels` given to the colour that it borders most. Throws ArtworkRefused for a picture that is
 * hardly more than specks: counting what each borders would take gigabytes.
 */
export function removeSpeckles(labels: Labels, leastPixels: number): Labels {
  let current = labels;
  for (let round = 0; round < mostRounds; round++) {
    const next = oneRound(current, leastPixels);
    if (!next) return current;
    current = next;
  }
  return current;
}

function oneRound(labels: Labels, leastPixels: number): Labels | null {
  const { width, height } = labels;
  const { of, areas } = pixelAreas(labels);
  if (areas.length > artworkLimits.pictureAreas) throw new ArtworkRefused("picture.too-many-pieces");
  const small = areas.map(({ pixels }) => pixels < leastPixels);
  if (areas.length < 2 || !small.includes(true)) return null;
  const borders = new Map<number, Map<number, number>>();
  const touch = (area: number, other: number): void => {
    if (area === other || !small[area]) return;
    const label = areas[other]?.label ?? 0;
    const counts = borders.get(area) ?? new Map<number, number>();
    // A small neighbour may go itself: it counts only where nothing else is.
    counts.set(label, (counts.get(label) ?? 0) + (small[other] ? 0.01 : 1));
    borders.set(area, counts);
  };
  for (let pixel = 0; pixel < of.length; pixel++) {
    const area = of[pixel] ?? 0;
    if ((pixel + 1) % width !== 0) meet(area, of[pixel + 1] ?? 0);
    if (pixel + width < width * height) meet(area, of[pixel + width] ?? 0);
  }
  function meet(a: number, b: number): void {
    touch(a, b);
    touch(b, a);
  }
  const becomes = areas.map(({ label }, area) => {
    const counts = [...(borders.get(area) ?? [])].sort((a, b) => b[1] - a[1] || a[0] - b[0]);
    return counts[0]?.[0] ?? label;
  });
  const first = labels.first.slice();
  const second = labels.second.slice();
  const share = labels.share.slice();
  let changed = false;
  for (let pixel = 0; pixel < of.length; pixel++) {
    const area = of[pixel] ?? 0;
    const label = becomes[area] ?? 0;
    if (!small[area] || label === areas[area]?.label) continue;
    first[pixel] = second[pixel] = label;
    share[pixel] = 1;
    changed = true;
  }
  return changed ? { ...labels, first, second, share } : null;
}
