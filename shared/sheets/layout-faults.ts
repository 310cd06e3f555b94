import { boxContains, boxesOverlap, boxGrow } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Region } from "../geometry/path.ts";
import { regionTransform, translateMatrix } from "../geometry/transform.ts";
import type { LaidShape } from "./cut-shape.ts";
import type { LaidCopy } from "./filler.ts";
import type { SheetField } from "./sheet-field.ts";

/** What the kernel's grid of 0.001 mm and its flattened arcs may take from a gap, mm. */
const slackMm = 0.005;

/**
 * The copies of one field that must not stay: those that reach over its margin, and of two that are nearer than the gap
 * the later one. Judged with the kernel on the true outlines, whatever laid them there.
 */
export function layoutFaults(
  copies: readonly LaidCopy[],
  field: SheetField,
  { marginMm, gapMm }: { readonly marginMm: number; readonly gapMm: number },
  kernel: Kernel,
): ReadonlySet<LaidCopy> {
  const faults = new Set<LaidCopy>();
  const within = field.allowed ? kernel.offset(field.region, slackMm - marginMm, "round") : null;
  const grown = new Map<LaidShape, Region>();
  const grownOf = (laid: LaidShape): Region => {
    const known = grown.get(laid) ?? kernel.offset(laid.region, gapMm - slackMm, "round");
    grown.set(laid, known);
    return known;
  };
  const bodies = copies
    .map((copy) => ({ copy, box: boxOf(copy) }))
    .sort((a, b) => a.box.x - b.box.x || a.copy.item.index - b.copy.item.index);
  for (const { copy, box } of bodies) {
    if (!boxContains(boxGrow(field.inner, slackMm), box)) faults.add(copy);
    else if (within && kernel.difference(onSheet(copy, copy.laid.region), within).length > 0) faults.add(copy);
  }
  for (const [index, one] of bodies.entries()) {
    const reach = boxGrow(one.box, gapMm);
    const region = onSheet(one.copy, grownOf(one.copy.laid));
    for (let next = index + 1; next < bodies.length; next++) {
      const other = bodies[next];
      if (!other || other.box.x >= reach.x + reach.width) break;
      if (faults.has(one.copy) || faults.has(other.copy) || !boxesOverlap(reach, other.box)) continue;
      const overlap = kernel.intersect(region, onSheet(other.copy, other.copy.laid.region));
      if (overlap.length > 0) faults.add(one.copy.item.index > other.copy.item.index ? one.copy : other.copy);
    }
  }
  return faults;
}

function boxOf({ laid, x, y }: LaidCopy): Box {
  return { x, y, width: laid.box.width, height: laid.box.height };
}

function onSheet({ laid, x, y }: LaidCopy, region: Region): Region {
  return regionTransform(region, translateMatrix(x - laid.box.x, y - laid.box.y));
}
