import { describe, expect, it } from "vitest";
import type { StockItem } from "#shared/contracts/stock.ts";
import type { Hardware } from "#shared/mockup/document.ts";
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
const screw: Extract<StockItem, { kind: "screw" }> = {
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

  it("names the parts of a standoff as its form does: only a barrel is a barrel", () => {
    const base = { stockId: id, name: "Standoff", finish: "#C3C1BA", barrelDiameter: 16 };
    const floor = { floorThickness: 3, floorHole: 4, countersunk: true, screw: screw.screw };
    const what = (hardware: Hardware) =>
      stockFacts({ id, name: "Standoff", version: 1, retiredAt: null, kind: "hardware", hardware, quantity: 8 }, "mm")
        .what;
    expect(what({ kind: "blindStud", ...base, barrelLength: 10, studDiameter: 4, studLength: 22 })).toBe(
      "hidden stud 22 mm long, spacer 10 mm",
    );
    expect(what({ kind: "blindStud", ...base, barrelLength: 0, studDiameter: 4, studLength: 22 })).toBe(
      "hidden stud 22 mm long",
    );
    expect(
      what({ kind: "edgeGrip", ...base, ...floor, barrelLength: 12, slotWidth: 5.5, gripDepth: 7, height: 22 }),
    ).toBe("grips the edge, slot 5.5 mm, 12 mm above the wood");
  });
});
