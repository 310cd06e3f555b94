import type { WarningCode } from "../artwork/warnings.ts";

/** Pixels in a millimetre, as a picture's file states them. */
export type Density = { readonly x: number; readonly y: number };

/** The longer side, in mm, of a picture that tells no size. */
const guessedLongerMm = 300;
/** A sign's artwork is hardly smaller or larger than this, in mm: another size was never meant. */
const smallestMm = 20;
const largestMm = 3_000;
/** Programs write 72 or 96 an inch into files without being asked. */
const unasked = [72, 96].map((perInch) => perInch / 25.4);

/**
 * Size of a pixel in mm: from the density that the file states where that makes sense, else so that the longer side is 300 mm. Always with a
 * warning: a picture is rarely as large as its sign.
 */
export function pictureSize(
  { width, height }: { readonly width: number; readonly height: number },
  density: Density | null,
): { readonly mmPerPx: number; readonly warning: WarningCode } {
  const longer = Math.max(width, height);
  if (density && density.x > 0 && Math.abs(density.x / density.y - 1) < 0.01) {
    const longerMm = longer / density.x;
    const isStated = unasked.every((usual) => Math.abs(density.x / usual - 1) > 0.01);
    if (isStated && longerMm >= smallestMm && longerMm <= largestMm)
      return { mmPerPx: 1 / density.x, warning: "size.from-density" };
  }
  return { mmPerPx: guessedLongerMm / longer, warning: "size.of-picture" };
}
