import type { Banded } from "../units/banded.ts";

/**
 * What a sheet of a nominal thickness in mm may measure: cast acrylic ±(0.4 + 0.1 t) (ISO 7823-1), extruded ±10 % under
 * 3 mm and ±5 % from 3 mm (ISO 7823-2). Never less than nothing.
 */
export function sheetBand(process: "cast" | "extruded", thicknessMm: number): Banded {
  const tolerance =
    process === "cast" ? 0.4 + 0.1 * thicknessMm : thicknessMm < 3 ? 0.1 * thicknessMm : 0.05 * thicknessMm;
  return { nominal: thicknessMm, least: Math.max(0, thicknessMm - tolerance), most: thicknessMm + tolerance };
}
