import { standardStock } from "../materials/standard-stock.ts";
import type { DryFitContext } from "./rule.ts";

/** A shop that works in mm, inside, with the standard stock. */
export const usualContext: DryFitContext = {
  unit: "mm",
  place: "inside",
  walkway: false,
  overhead: false,
  electrical: false,
  words: "",
  stock: standardStock,
};
