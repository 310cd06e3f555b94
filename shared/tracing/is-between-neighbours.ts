import { inkSize } from "./ink-space.ts";

/** Four lines through a pixel: along, down and both ways across. */
const lines = [
  [1, 0],
  [0, 1],
  [1, 1],
  [1, -1],
] as const;
/** Two pixels farther apart in ink have an edge between them; what noise and rounding put beside the straight line from one to the other. */
const drawn = { edge: 8, beside: 12 };
const noisy = { edge: 24, beside: 20 };

/**
 * Whether a pixel's ink lies on the way from that of one neighbour to that of the one opposite: what smoothing an edge makes, and a
 * stroke of its own does not. Looks one and two pixels away.
 */
export function isBetweenNeighbours(
  inks: Float32Array,
  pixel: number,
  { width, height, lossy }: { width: number; height: number; lossy: boolean },
): boolean {
  const noise = lossy ? noisy : drawn;
  const x = pixel % width;
  const y = (pixel - x) / width;
  for (let reach = 1; reach <= 2; reach++) {
    for (const [dx, dy] of lines) {
      const ax = x + dx * reach;
      const ay = y + dy * reach;
      const bx = x - dx * reach;
      const by = y - dy * reach;
      if (Math.min(ax, ay, bx, by) < 0 || Math.max(ax, bx) >= width || Math.max(ay, by) >= height) continue;
      if (isBetween(inks, pixel * inkSize, (ay * width + ax) * inkSize, (by * width + bx) * inkSize, noise))
        return true;
    }
  }
  return false;
}

function isBetween(
  inks: Float32Array,
  at: number,
  a: number,
  b: number,
  { edge, beside }: { edge: number; beside: number },
): boolean {
  let along = 0;
  let length = 0;
  for (let n = 0; n < inkSize; n++) {
    const whole = (inks[a + n] ?? 0) - (inks[b + n] ?? 0);
    along += whole * ((inks[at + n] ?? 0) - (inks[b + n] ?? 0));
    length += whole * whole;
  }
  if (length < edge * edge) return false;
  const share = along / length;
  if (share < 0.04 || share > 0.96) return false;
  let off = 0;
  for (let n = 0; n < inkSize; n++)
    off += ((inks[at + n] ?? 0) - share * (inks[a + n] ?? 0) - (1 - share) * (inks[b + n] ?? 0)) ** 2;
  return off <= beside * beside;
}
