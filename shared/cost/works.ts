import type { PriceBook } from "./price-book.ts";

/** A machine by what it does to a sign. `pockets`: it also clears areas. */
export type MachineWork = {
  readonly id: string;
  readonly name: string;
  readonly cuts: boolean;
  readonly pockets: boolean;
};

/** The kinds of machine work that a sign's quantities are counted under; the shop says what each costs and how fast it goes. */
export const machineWorks = {
  sheetCutting: { id: "sheet cutting", name: "Cutting sheet", cuts: true, pockets: false },
  engraving: { id: "engraving", name: "Engraving pockets", cuts: false, pockets: true },
  routing: { id: "routing", name: "Routing boards and pockets", cuts: true, pockets: true },
  sawing: { id: "sawing", name: "Sawing boards, slats and frames", cuts: true, pockets: false },
} as const satisfies Record<string, MachineWork>;

/** The kinds of hand work. */
export const labourWorks = {
  piece: { id: "piece", name: "Cleaning and setting, a piece" },
  standoff: { id: "standoff", name: "Boring and screwing, a standoff" },
  slat: { id: "slat", name: "Sawing to fit and laying, a slat" },
  frame: { id: "frame piece", name: "Fitting, a piece of frame" },
  sign: { id: "sign", name: "Sanding, hanging and packing, a sign" },
} as const;

/** Ids of what is in no stock list. */
export const bradEntry = { id: "brads", name: "Brads" } as const;
export const sandingEntry = { id: "sanding", name: "Sanding" } as const;

/**
 * Starting figures for what a shop has not stated, our choice: a book asks for a figure even where the work doesn't use
 * it, and a form begins with something to correct.
 */
export const usualPaces = { cutMmPerMinute: 600, pocketMm2PerMinute: 1500, setUpMinutes: 10 } as const;
export const usualWaste = { sheet: 0.5, board: 0.2, strip: 0.15 } as const;

/** A book without a price. */
export const emptyPriceBook = (currency: string): PriceBook => ({
  version: 1,
  currency,
  materials: [],
  machines: [],
  hardware: [],
  adhesives: [],
  finishes: [],
  labour: [],
  markup: 0,
  tax: { name: "Tax", share: 0 },
});
