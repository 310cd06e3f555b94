import { checked, lengthRange, type Outcome } from "../units/outcome.ts";

/**
 * Stroke of a letter over its height, without unit. Published limits: 0.1 to 0.3 for visual characters, 0.15 at most for
 * raised ones (2010 ADA Standards, 703.5.7 and 703.2.6).
 */
export function strokeToHeight(stroke: number, height: number): Outcome<number> {
  return checked({ stroke: [stroke, lengthRange], height: [height, lengthRange] }, () => stroke / height);
}
