import { latticeValue } from "./noise.ts";
import { stripTones } from "./strip-grain.ts";

/** Tones nearer than this look like one plank. */
const leastStep = 2;

/**
 * A tone for each strip of a row of neighbours, by chance but at least two steps from the one before, and from the strip
 * it meets on the other side (`met`) where that can be. Same seed, same tones.
 */
export function tonesOfRow(seeds: readonly number[], met: readonly (number | undefined)[] = []): number[] {
  const tones: number[] = [];
  for (const [index, seed] of seeds.entries()) {
    const before = tones[index - 1];
    const far = (tone: number, other: number | undefined) => other === undefined || Math.abs(tone - other) >= leastStep;
    const all = Array.from({ length: stripTones }, (_, tone) => tone).filter((tone) => far(tone, before));
    const apart = all.filter((tone) => far(tone, met[index]));
    const choice = apart.length > 0 ? apart : all;
    tones.push(choice[Math.floor(latticeValue(seed, 5, 131) * choice.length * 0.9999)] ?? 0);
  }
  return tones;
}
