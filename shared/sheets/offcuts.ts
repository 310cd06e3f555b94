import { regionAreaMm2 } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import { connectedPieces } from "../geometry/connected.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Region } from "../geometry/path.ts";

/**
 * What two straight cuts beside the pieces leave of a sheet, the larger first: one right across it behind the pieces, the
 * other across what is left beside them, in whichever order leaves the larger offcut. Only parts that are at least
 * `leastMm` long and wide; all of the sheet when nothing is cut from it.
 */
export function offcutsOf(
  sheet: Region,
  box: Box,
  used: Box | null,
  { kerfMm, leastMm }: { readonly kerfMm: number; readonly leastMm: number },
  kernel: Kernel,
): readonly Region[] {
  if (!used) return worthKeeping([sheet], leastMm);
  const right = used.x + used.width + kerfMm;
  const bottom = used.y + used.height + kerfMm;
  const farRight = box.x + box.width;
  const farBottom = box.y + box.height;
  const rightFirst = [
    { x: right, y: box.y, width: farRight - right, height: box.height },
    { x: box.x, y: bottom, width: right - kerfMm - box.x, height: farBottom - bottom },
  ];
  const bottomFirst = [
    { x: box.x, y: bottom, width: box.width, height: farBottom - bottom },
    { x: right, y: box.y, width: farRight - right, height: bottom - kerfMm - box.y },
  ];
  const [better] = [rightFirst, bottomFirst]
    .map((boxes) =>
      worthKeeping(
        boxes.flatMap((each) => partsIn(sheet, each, kernel)),
        leastMm,
      ),
    )
    .sort((a, b) => largestArea(b) - largestArea(a));
  return better ?? [];
}

function partsIn(sheet: Region, { x, y, width, height }: Box, kernel: Kernel): Region[] {
  if (width <= 0 || height <= 0) return [];
  const window = [
    { x, y },
    { x: x + width, y },
    { x: x + width, y: y + height },
    { x, y: y + height },
  ];
  return connectedPieces(kernel.intersect(sheet, [window]));
}

function worthKeeping(parts: readonly Region[], leastMm: number): Region[] {
  return parts
    .filter((part) => {
      const box = boxOfRegion(part);
      return box !== null && box.width >= leastMm && box.height >= leastMm;
    })
    .sort((a, b) => regionAreaMm2(b) - regionAreaMm2(a));
}

function largestArea(parts: readonly Region[]): number {
  return parts.reduce((most, part) => Math.max(most, regionAreaMm2(part)), 0);
}
