import { boxCentre, boxOfPath } from "../geometry/box.ts";
import { fitRing } from "../geometry/fit-ring.ts";
import { flattenPath } from "../geometry/flatten.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Path, Placement, Point, Region } from "../geometry/path.ts";
import { placePath, placePoint } from "../geometry/placement.ts";
import { pathTransform, translateMatrix } from "../geometry/transform.ts";

/** A piece's outline in its own plane and where that lies on the board. */
export type Outline = { readonly path: Path; readonly placement: Placement };

/** An outline worked out: in its own plane about the middle of its box there, with its placement on the board. */
export type Shaped = Outline;

/** A quarter of what other figures are flattened to, so that curves fitted again stay as true as those. */
export const flatMm = 0.005;
/** How far a curve fitted again may run from what was worked out. */
export const fitMm = 0.02;

/** A plane that is the board's own. */
export const asOnBoard: Placement = { x: 0, y: 0, turn: 0, scale: 1, mirrored: false };

/** What an outline covers on the board, finely flattened, as non-crossing rings; empty when it covers nothing. */
export function coveredBy({ path, placement }: Outline, kernel: Kernel): Region {
  return remembered(kernel, [path, placement], "finely covered", () =>
    kernel.union(flattenPath(placePath(path, placement), flatMm), "evenodd"),
  );
}

/** Straight rings as lines and curves. */
export function tracedPath(region: Region): Path {
  return region.map((ring) => fitRing(ring, fitMm));
}

/** Straight rings on the board as an outline with curves, as `trace` finds them, about its own middle; null for none. */
export function shapedFromRegion(region: Region, trace: (region: Region) => Path = tracedPath): Shaped | null {
  return shapedAboutMiddle({ path: trace(region), placement: asOnBoard });
}

/** The same outline with its origin in the middle of its box, to a thousandth of a mm, there where it lies; null without rings. */
export function shapedAboutMiddle({ path, placement }: Outline): Shaped | null {
  const box = boxOfPath(path);
  if (!box) return null;
  const middle = onGrid(boxCentre(box));
  return {
    path: pathTransform(path, translateMatrix(-middle.x, -middle.y)),
    placement: { ...placement, ...placePoint(middle, placement) },
  };
}

const onGrid = ({ x, y }: Point): Point => ({ x: Math.round(x * 1000) / 1000, y: Math.round(y * 1000) / 1000 });
