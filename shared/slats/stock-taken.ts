import { checked, type Outcome, spanRange } from "../units/outcome.ts";
import type { Slat } from "./slat-layout.ts";

/** What a slat takes of a stock length, mm. */
export type StockTaken = {
  /** On its own: from long point to long point and the saw's kerf along the slat. */
  readonly aloneMm: number;
  /**
   * Beside others with the same two parallel cuts, point against point: what each takes, and what the first takes more. Null
   * where its ends are not parallel.
   */
  readonly nested: { readonly eachMm: number; readonly onceMm: number } | null;
};

/**
 * What a slat takes of its stock: L + kerf/sin(blade to slat), by its flattest cut. Two parallel cuts nest: each slat then
 * takes its middle length and a kerf, and one point more for the whole bar. Kerf 0 to 10 mm. Arithmetic.
 */
export function stockTaken(
  slat: Pick<Slat, "longPoint" | "near" | "far">,
  { kerf, slatWidth }: { readonly kerf: number; readonly slatWidth: number },
): Outcome<StockTaken> {
  return checked({ kerf: [kerf, { least: 0, most: 10 }], slatWidth: [slatWidth, spanRange] }, () => {
    const setting = Math.max(...[...slat.near, ...slat.far].map((cut) => cut.setting));
    const turned = (setting * Math.PI) / 180;
    // The blade stands 90 − setting to the slat.
    const along = kerf / Math.cos(turned);
    const point = slatWidth * Math.tan(turned);
    return {
      aloneMm: slat.longPoint + along,
      nested: hasParallelCuts(slat) ? { eachMm: slat.longPoint - point + along, onceMm: point } : null,
    };
  });
}

const upright = new Set(["spine", "left", "right"]);
const level = new Set(["upper", "lower"]);

/** Whether both ends are one cut each, along parallel edges of a rectangular board. */
export function hasParallelCuts({ near, far }: Pick<Slat, "near" | "far">): boolean {
  const [one, second] = near;
  const [other, fourth] = far;
  if (!one || !other || second || fourth) return false;
  return [upright, level].some((edges) => edges.has(one.edge) && edges.has(other.edge));
}
