import type { Stock } from "../materials/stock.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { formatLengthWithUnit, formatSize } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { adhesiveId, boardId, hangingId, hardwareId, screwId, sheetId } from "./entry-ids.ts";
import { bradEntry, labourWorks, machineWorks, sandingEntry } from "./works.ts";

export type Thing = { readonly id: string; readonly name: string };

/** Everything that a price can be asked for in a shop with that stock, in the stock list's order. */
export type ThingsToPrice = {
  readonly sheets: readonly Thing[];
  readonly boards: readonly Thing[];
  readonly machines: readonly Thing[];
  readonly hardware: readonly Thing[];
  /** `isTape`: counted by its area. */
  readonly adhesives: readonly (Thing & { readonly isTape: boolean })[];
  readonly finishes: readonly Thing[];
  readonly labour: readonly Thing[];
};

/** What hangs a sign, a set for each; null where nothing is bought for it. */
export const hangingNames: Readonly<Record<MockupDocument["hanging"]["kind"], string | null>> = {
  cleat: "Cleat, a pair",
  keyholes: "Keyhole plates, a set",
  wire: "Wire and eyes, a set",
  "screwed through": "Wall screws, a set",
  "through standoffs": null,
  none: null,
};

export const sheetName = (stock: string, thicknessMm: number, unit: LengthUnit): string =>
  `${stock}, ${formatLengthWithUnit(thicknessMm, unit)}`;

export const boardName = sheetName;

export const stripName = (
  stock: string,
  { widthMm, thicknessMm }: { readonly widthMm: number; readonly thicknessMm: number },
  unit: LengthUnit,
): string => `${stock}, strip ${formatSize(widthMm, thicknessMm, unit)}`;

/** Strips and coats are named by drawings and not by the stock list, so the shop adds those itself. */
export function thingsToPrice(stock: Stock, unit: LengthUnit): ThingsToPrice {
  const hangings = ["cleat", "keyholes", "wire", "screwed through"] as const;
  return {
    sheets: stock.acrylics.flatMap(({ acrylic, thicknessesMm }) =>
      thicknessesMm.map((mm) => ({ id: sheetId(acrylic, mm, stock), name: sheetName(acrylic.name, mm, unit) })),
    ),
    boards: stock.woods.flatMap(({ wood, thicknessesMm }) =>
      thicknessesMm.map((mm) => ({ id: boardId(wood, mm, stock), name: boardName(wood.name, mm, unit) })),
    ),
    machines: Object.values(machineWorks).map(({ id, name }) => ({ id, name })),
    hardware: [
      ...stock.hardware.map(({ hardware }) => ({ id: hardwareId(hardware, stock), name: hardware.name })),
      ...stock.screws.map((screw) => ({ id: screwId(screw), name: screw.name })),
      bradEntry,
      ...hangings.map((kind) => ({ id: hangingId(kind), name: hangingNames[kind] ?? kind })),
    ],
    adhesives: stock.adhesives.map((one) => ({
      id: adhesiveId(one, stock),
      name: one.name,
      isTape: one.family === "high-bond tape",
    })),
    finishes: [sandingEntry],
    labour: Object.values(labourWorks),
  };
}
