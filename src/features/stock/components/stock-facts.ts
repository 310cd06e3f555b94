import type { StockItem } from "#shared/contracts/stock.ts";
import type { SheetsOnHand } from "#shared/materials/stock.ts";
import type { Hardware, Screw } from "#shared/mockup/document.ts";
import { formatFine, formatLength, formatLengthWithUnit, formatSize } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";

/** Thicknesses on hand as one phrase: "3, 5, 8 mm". */
const thicknesses = (mm: readonly number[], unit: LengthUnit): string =>
  mm.length === 0
    ? "no thickness"
    : `${mm.map((length) => formatLength(length, unit)).join(", ")}${unit === "mm" ? " mm" : ""}`;

export type StockFacts = {
  readonly colour: string | null;
  readonly swatch: "sheet" | "wood" | "metal";
  /** What it is, in a phrase. */
  readonly what: string;
  /** How thick, or how many. */
  readonly amount: string;
  /** What is on hand of it beyond that, a line each. */
  readonly more: readonly string[];
};

/** What the stock list shows of an item. */
export function stockFacts(item: StockItem, unit: LengthUnit): StockFacts {
  switch (item.kind) {
    case "acrylic":
      return {
        colour: item.acrylic.colour,
        swatch: "sheet",
        what: `${item.acrylic.look}, ${item.acrylic.process}${item.acrylic.facesDiffer ? ", faces differ" : ""}`,
        amount: thicknesses(item.thicknessesMm, unit),
        more: item.sheets.map((sheet) => sheetWords(sheet, unit)),
      };
    case "wood":
      return {
        colour: item.wood.colour,
        swatch: "wood",
        what: `${item.wood.hardness}, ${item.wood.moisturePercent} % moisture, gravity ${item.wood.gravity}`,
        amount: thicknesses(item.thicknessesMm, unit),
        more: [],
      };
    case "hardware":
      return {
        colour: item.hardware.finish,
        swatch: "metal",
        what: hardwareWords(item.hardware, unit),
        amount: quantityWords(item.quantity),
        more: [],
      };
    case "screw":
      return {
        colour: null,
        swatch: "metal",
        what: screwWords(item.screw, unit),
        amount: quantityWords(item.quantity),
        more: [],
      };
    case "adhesive":
      return { colour: null, swatch: "sheet", what: item.adhesive.family, amount: "", more: [] };
  }
}

const quantityWords = (quantity: number | null): string =>
  quantity === null ? "not counted yet" : `${quantity} on hand`;

function sheetWords({ thicknessMm, widthMm, heightMm, quantity }: SheetsOnHand, unit: LengthUnit): string {
  const count = quantity === null ? "not counted" : quantity === 0 ? "none left" : String(quantity);
  return `${formatLengthWithUnit(thicknessMm, unit)}, ${formatSize(widthMm, heightMm, unit)}: ${count}`;
}

function screwWords({ head, diameter, length }: Screw, unit: LengthUnit): string {
  return `${head} head, ${formatFine(diameter, unit)} thick, ${formatLengthWithUnit(length, unit)} long`;
}

function hardwareWords(hardware: Hardware, unit: LengthUnit): string {
  const length = (mm: number) => formatLengthWithUnit(mm, unit);
  switch (hardware.kind) {
    case "capStud":
      return `barrel ${length(hardware.barrelLength)}, cap ${length(hardware.capDiameter)} across, screw ${hardware.screw.name}`;
    case "throughScrew":
      return `loose spacer ${length(hardware.barrelLength)}, screw ${hardware.screw.name} through the panel`;
    case "blindStud":
      return `hidden stud ${length(hardware.studLength)} long${hardware.barrelLength > 0 ? `, spacer ${length(hardware.barrelLength)}` : ""}`;
    case "edgeGrip":
      return `grips the edge, slot ${length(hardware.slotWidth)}, ${length(hardware.barrelLength)} above the wood`;
  }
}
