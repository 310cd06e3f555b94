import { MaxRectsPacker, PACKING_LOGIC } from "maxrects-packer";

type Size = { readonly width: number; readonly height: number };

/** Lengths are tried from the shortest on in steps of this, mm. */
const stepMm = 2;

/**
 * The shortest strip, with a margin at both ends, on which the packer lays these boxes a gap apart, turned by right angles
 * as it likes: the best of its two ways to choose and three orders. The yardstick for laying true shapes.
 */
export function boxPackedLengthMm(boxes: readonly Size[], strip: { widthMm: number; gapMm: number }): number {
  const orders = [
    boxes,
    boxes.toSorted((a, b) => b.width * b.height - a.width * a.height),
    boxes.toSorted((a, b) => Math.max(b.width, b.height) - Math.max(a.width, a.height)),
  ];
  const area = boxes.reduce((sum, { width, height }) => sum + width * height, 0);
  let best = Number.POSITIVE_INFINITY;
  for (const logic of [PACKING_LOGIC.MAX_AREA, PACKING_LOGIC.MAX_EDGE]) {
    for (const order of orders) {
      for (let length = area / strip.widthMm; length < best; length += stepMm) {
        const end = packedEnd(order, length, logic, strip);
        if (end !== null) best = Math.min(best, end);
      }
    }
  }
  return best;
}

function packedEnd(
  boxes: readonly Size[],
  length: number,
  logic: PACKING_LOGIC,
  { widthMm, gapMm }: { widthMm: number; gapMm: number },
): number | null {
  const packer = new MaxRectsPacker(widthMm, length, gapMm, {
    smart: false,
    pot: false,
    square: false,
    allowRotation: true,
    border: gapMm,
    logic,
  });
  for (const { width, height } of boxes) packer.add(width, height, null);
  const [bin] = packer.bins;
  if (packer.bins.length !== 1 || !bin || bin.rects.length !== boxes.length) return null;
  return Math.max(...bin.rects.map(({ y, height }) => y + height)) + gapMm;
}
