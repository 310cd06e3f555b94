import { simplifyRing } from "../artwork/simplify-ring.ts";
import { regionAreaMm2 } from "../geometry/area.ts";
import { fitRing } from "../geometry/fit-ring.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Path } from "../geometry/path.ts";
import { pathTransform, scaleMatrix } from "../geometry/transform.ts";

/** Cap height at which outlines are joined, mm, so that a small letter is as true as a large one. */
const workMm = 300;
const flattenMm = 0.01;
const simplifyMm = 0.001;
const fitMm = 0.01;
/** Less than this of a letter is what the kernel's grid makes of its curves. */
const sameShare = 1e-5;

/**
 * A letter's outline without overlaps, to be read by the even-odd rule. Where no contour lies over another the font's own
 * curves stay as they are; else the contours are joined and curves fitted again, within a 15,000th of the cap height.
 * Takes contours in mm by the nonzero rule, of a face set at `capHeight` mm.
 */
export function letterOutline(contours: Path, capHeight: number, kernel: Kernel): Path {
  const scale = workMm / capHeight;
  const flat = flattenPath(pathTransform(contours, scaleMatrix(scale)), flattenMm);
  const joined = kernel.union(flat, "nonzero");
  const area = regionAreaMm2(joined);
  if (area === 0) return [];
  const asTheyAre = regionAreaMm2(kernel.union(flat, "evenodd"));
  if (Math.abs(area - asTheyAre) <= sameShare * area) return contours;
  const rings = joined.map((ring) => fitRing(simplifyRing(ring, simplifyMm), fitMm));
  return pathTransform(rings, scaleMatrix(1 / scale));
}
