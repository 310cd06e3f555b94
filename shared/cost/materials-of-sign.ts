import type { MaterialMeasure } from "./cost-quantities.ts";
import { boardId, sheetId, stripId } from "./entry-ids.ts";
import type { SignMeasures } from "./measure-sign.ts";
import type { PriceBook } from "./price-book.ts";
import type { Asked, PlannedStock, PricedSign } from "./priced-sign.ts";
import { boardName, sheetName, stripName } from "./things-to-price.ts";

type AskedMaterial = Asked<{ readonly measure: MaterialMeasure }>;
type Entry = PriceBook["materials"][number];
type Sheet = SignMeasures["sheets"][number];
type Strip = SignMeasures["strips"][number];

/**
 * Sheet, boards and strips of a sign, each by what its entry is priced by. Sheets: area, or whole sheets of the plan; without a
 * plan the share of a sheet that area and waste come to. Boards: area, or a board a sign. Strips: length, or whole bars of the
 * plan; without one as many bars as the length of all signs and its waste fill. A strip without an entry of its own is taken
 * by area from the board of its thickness, where that is priced by area.
 */
export function materialsOfSign(sign: PricedSign): { each: AskedMaterial[]; once: AskedMaterial[] } {
  const { measures, book, stock, unit } = sign;
  const entries = new Map(book.materials.map((entry) => [entry.id, entry]));
  const each: AskedMaterial[] = [];
  const once: AskedMaterial[] = [];

  for (const sheet of measures.sheets) {
    const id = sheetId(sheet.stock, sheet.thicknessMm, stock);
    const name = sheetName(sheet.stock.name, sheet.thicknessMm, unit);
    const entry = entries.get(id);
    const whole = entry?.unit === "sheet" ? plannedSheets(sheet, sign.plan) : null;
    if (whole !== null) once.push({ name, quantity: { id, measure: { kind: "count", count: whole } } });
    else each.push({ name, quantity: { id, measure: sheetMeasure(sheet, entry, sign) } });
  }

  const { board } = measures;
  const id = boardId(board.stock, board.thicknessMm, stock);
  const name = boardName(board.stock.name, board.thicknessMm, unit);
  each.push({ name, quantity: { id, measure: boardMeasure(board.areaMm2, entries.get(id)) } });

  for (const strip of measures.strips) {
    const own = stripId(strip.stock, strip, stock);
    const plank = boardId(strip.stock, strip.thicknessMm, stock);
    const ownName = stripName(strip.stock.name, strip, unit);
    const entry = entries.get(own);
    if (entry?.unit === "bar") {
      const count = plannedBars(strip, sign.plan) ?? barsFilled(strip, entry, sign);
      once.push({ name: ownName, quantity: { id: own, measure: { kind: "count", count } } });
    } else if (!entry && isByArea(entries.get(plank))) {
      const mm2 = strip.lengthMm * strip.widthMm;
      const from = boardName(strip.stock.name, strip.thicknessMm, unit);
      each.push({ name: from, quantity: { id: plank, measure: { kind: "area", mm2 } } });
    } else each.push({ name: ownName, quantity: { id: own, measure: { kind: "length", mm: strip.lengthMm } } });
  }
  return { each, once };
}

const isByArea = (entry: Entry | undefined): boolean => entry?.unit === "m²" || entry?.unit === "ft²";

function sheetMeasure({ stock, thicknessMm, areaMm2 }: Sheet, entry: Entry | undefined, sign: PricedSign) {
  if (entry?.unit !== "sheet") return { kind: "area", mm2: areaMm2 } as const;
  const row =
    sign.stock.acrylics.find(({ acrylic }) => stock.stockId !== null && acrylic.stockId === stock.stockId) ??
    sign.stock.acrylics.find(({ acrylic }) => acrylic.name === stock.name);
  const known = row?.sheets.find((sheet) => sheet.thicknessMm === thicknessMm);
  const sheetMm2 = known ? known.widthMm * known.heightMm : sign.saws.usualSheetWidthMm * sign.saws.usualSheetHeightMm;
  return { kind: "count", count: (areaMm2 * (1 + entry.waste)) / sheetMm2 } as const;
}

const boardMeasure = (mm2: number, entry: Entry | undefined): MaterialMeasure =>
  entry?.unit === "each" ? { kind: "count", count: 1 } : { kind: "area", mm2 };

function plannedSheets({ stock, thicknessMm }: Sheet, plan: PlannedStock | undefined): number | null {
  const planned = plan?.sheets.find((one) => one.thicknessMm === thicknessMm && one.stock.name === stock.name);
  return planned?.count ?? null;
}

function plannedBars({ stock, widthMm, thicknessMm }: Strip, plan: PlannedStock | undefined): number | null {
  const same = plan?.bars.filter(
    (one) => one.widthMm === widthMm && one.thicknessMm === thicknessMm && one.stock.name === stock.name,
  );
  return same && same.length > 0 ? same.reduce((sum, { count }) => sum + count, 0) : null;
}

const barsFilled = ({ lengthMm }: Strip, { waste }: Entry, { signs, saws }: PricedSign): number =>
  Math.ceil((lengthMm * signs * (1 + waste)) / saws.barLengthMm - 1e-9);
