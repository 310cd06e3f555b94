import { describe, expect, it } from "vitest";
import type { StockItem } from "#shared/contracts/stock.ts";
import { stockFacts } from "@/features/stock/components/stock-facts.ts";

const id = "00000000-0000-4000-8000-000000000501";
const acrylic: Extract<StockItem, { kind: "acrylic" }> = {
  id,
  name: "Dark blue",
  version: 1,
  retiredAt: null,
  kind: "acrylic",
  acrylic: {
    kind: "acrylic",
    stockId: id,
    name: "Dark blue",
    colour: "#26304F",
    look: "mirror",
    process: "cast",
    facesDiffer: true,
    densityKgM3: 1190,
  },
  thicknessesMm: [3, 5, 12.7],
  sheets: [
    { thicknessMm: 3, widthMm: 1220, heightMm: 610, quantity: 2 },
    { thicknessMm: 5, widthMm: 610, heightMm: 610, quantity: 0 },
    { thicknessMm: 12.7, widthMm: 610, heightMm: 305, quantity: null },
  ],
};
const screw: StockItem = {
  id,
  name: "No. 6 × 16, flat head",
  version: 1,
  retiredAt: null,
  kind: "screw",
  screw: {
    name: "No. 6 × 16, flat head",
    gauge: 6,
    head: "flat",
    diameter: 3.5052,
    length: 16,
    headDiameter: 7.0866,
    headHeight: 2.06,
  },
  quantity: 240,
};

describe("stockFacts", () => {
  it("says how a sheet looks, which thicknesses there are and what was counted of them", () => {
    expect(stockFacts(acrylic, "mm")).toEqual({
      colour: "#26304F",
      swatch: "sheet",
      what: "mirror, cast, faces differ",
      amount: "3, 5, 12.7 mm",
      more: ["3 mm, 1220 × 610 mm: 2", "5 mm, 610 × 610 mm: none left", "12.7 mm, 610 × 305 mm: not counted"],
    });
  });
  it("says them in inches", () => {
    const { amount, more } = stockFacts(acrylic, "in");
    expect(amount).toBe("1/8″, 3/16″, 1/2″");
    expect(more[0]).toBe("1/8″, 48 1/16″ × 24″: 2");
  });
  it("says what a screw is and how many there are", () => {
    expect(stockFacts(screw, "mm")).toMatchObject({
      what: "flat head, 3.51 mm thick, 16 mm long",
      amount: "240 on hand",
    });
  });
});
