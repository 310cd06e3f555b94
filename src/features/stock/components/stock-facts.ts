import type { StockItem } from "#shared/contracts/stock.ts";
import type { Hardware } from "#shared/mockup/document.ts";
import { formatLength, formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";

/** Thicknesses on hand as one phrase: "3, 5, 8 mm". */
const thicknesses = (mm: readonly number[], unit: LengthUnit): string =>
  mm.length === 0
    ? "none on hand"
    : `${mm.map((length) => formatLength(length, unit)).join(", ")}${unit === "mm" ? " mm" : ""}`;

export type StockFacts = {
  readonly colour: string | null;
  readonly swatch: "sheet" | "wood" | "metal";
  /** What it is, in a phrase. */
  readonly what: string;
  /** How much or how thick. */
  readonly amount: string;
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
      };
    case "wood":
      return {
        colour: item.wood.colour,
        swatch: "wood",
        what: `${item.wood.hardness}, ${item.wood.moisturePercent} % moisture`,
        amount: thicknesses(item.thicknessesMm, unit),
      };
    case "hardware":
      return {
        colour: item.hardware.finish,
        swatch: "metal",
        what: hardwareWords(item.hardware, unit),
        amount: item.quantity === null ? "not counted yet" : `${item.quantity} on hand`,
      };
    case "adhesive":
      return { colour: null, swatch: "sheet", what: item.adhesive.family, amount: "" };
  }
}

function hardwareWords(hardware: Hardware, unit: LengthUnit): string {
  const length = (mm: number) => formatLengthWithUnit(mm, unit);
  const barrel = `barrel ${length(hardware.barrelLength)}`;
  switch (hardware.kind) {
    case "capStud":
      return `${barrel}, cap ${length(hardware.capDiameter)} across, screw ${hardware.screw.name}`;
    case "throughScrew":
      return `loose spacer ${length(hardware.barrelLength)}, screw ${hardware.screw.name} through the panel`;
    case "blindStud":
      return `hidden stud ${length(hardware.studLength)} long, ${barrel}`;
    case "edgeGrip":
      return `grips the edge, slot ${length(hardware.slotWidth)}, ${barrel}`;
  }
}
