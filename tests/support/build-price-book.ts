import type { PriceBook } from "#shared/cost/price-book.ts";

/** A small shop's price book in euros: prices are made up. */
export function buildPriceBook(overrides: Partial<PriceBook> = {}): PriceBook {
  return {
    version: 1,
    currency: "EUR",
    materials: [
      { id: "ply", name: "Oak plywood 12 mm", unit: "m²", price: 4200, waste: 0.15 },
      { id: "strip", name: "Oak strip 38 × 9", unit: "m", price: 310, waste: 0.1 },
      { id: "acrylic", name: "Cast acrylic 3 mm", unit: "sheet", price: 8900, waste: 0.15 },
    ],
    machines: [
      { id: "laser", name: "Laser", perHour: 6000, cutMmPerMinute: 600, pocketMm2PerMinute: 2000, setUpMinutes: 10 },
    ],
    hardware: [
      { id: "standoff", name: "Standoff 15 × 19", price: 950, pack: 4 },
      { id: "screw", name: "Screw No. 6", price: 799, pack: 100 },
    ],
    adhesives: [{ id: "epoxy", name: "Epoxy", price: 2450, containerMl: 400, mlPerM2: 250, mlPerM: 12 }],
    finishes: [{ id: "oil", name: "Oil", pricePerM2: 380, minutesPerM2: 12, perHour: 4500 }],
    labour: [
      { id: "piece", name: "Bonding, a piece", perHour: 4800, minutesEach: 6 },
      { id: "slat", name: "Laying, a slat", perHour: 4800, minutesEach: 2 },
    ],
    markup: 0.35,
    tax: { name: "VAT", share: 0.19 },
    ...overrides,
  };
}
