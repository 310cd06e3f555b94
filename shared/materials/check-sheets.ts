import { lengthsEqual } from "../geometry/tolerance.ts";
import { formatFine } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { SheetsOnHand } from "./stock.ts";
import type { StockFault } from "./stock-fault.ts";

/** Thinner is film and thicker is a block, mm. */
const thinnest = 0.3;
const thickest = 150;

/** Thicknesses that a material comes in: at least one, each once, none absurd. */
export function checkThicknesses(thicknessesMm: readonly number[], unit: LengthUnit): StockFault[] {
  if (thicknessesMm.length === 0) return [{ path: [], detail: "Add at least one thickness." }];
  return thicknessesMm.flatMap((thickness, index): StockFault[] => {
    if (thickness < thinnest || thickness > thickest) {
      return [{ path: [index], detail: `From ${formatFine(thinnest, unit)} to ${formatFine(thickest, unit)} thick.` }];
    }
    const before = thicknessesMm.slice(0, index);
    return before.some((other) => lengthsEqual(other, thickness))
      ? [{ path: [index], detail: `${formatFine(thickness, unit)} stands here twice.` }]
      : [];
  });
}

/** Sheets on hand: each of a thickness that is listed, and each size once, whichever way it lies. */
export function checkSheets(
  sheets: readonly SheetsOnHand[],
  thicknessesMm: readonly number[],
  unit: LengthUnit,
): StockFault[] {
  return sheets.flatMap((sheet, index): StockFault[] => {
    if (!thicknessesMm.some((thickness) => lengthsEqual(thickness, sheet.thicknessMm))) {
      const detail = `${formatFine(sheet.thicknessMm, unit)} is not among the thicknesses above.`;
      return [{ path: [index, "thicknessMm"], detail }];
    }
    return sheets.slice(0, index).some((other) => isSameSize(other, sheet))
      ? [{ path: [index, "widthMm"], detail: "This size stands here twice. Put the two counts together." }]
      : [];
  });
}

function isSameSize(a: SheetsOnHand, b: SheetsOnHand): boolean {
  const [aShort, aLong] = sides(a);
  const [bShort, bLong] = sides(b);
  return lengthsEqual(a.thicknessMm, b.thicknessMm) && lengthsEqual(aShort, bShort) && lengthsEqual(aLong, bLong);
}

const sides = ({ widthMm, heightMm }: SheetsOnHand): [number, number] => [
  Math.min(widthMm, heightMm),
  Math.max(widthMm, heightMm),
];
