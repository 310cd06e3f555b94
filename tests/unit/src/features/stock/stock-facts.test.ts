import { describe, expect, it } from "vitest";
import type { StockItem } from "#shared/contracts/stock.ts";
import { stockFacts } from "@/features/stock/components/stock-facts.ts";

const id = "00000000-0000-4000-8000-000000000501";
const acrylic: StockItem = {
  id,
  name: "Dark blue",
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
};

describe("stockFacts", () => {
  it("says how a sheet looks and which thicknesses there are", () => {
    expect(stockFacts(acrylic, "mm")).toEqual({
      colour: "#26304F",
      swatch: "sheet",
      what: "mirror, cast, faces differ",
      amount: "3, 5, 12.7 mm",
    });
  });
  it("says them in inches", () => {
    expect(stockFacts(acrylic, "in").amount).toBe("1/8″, 3/16″, 1/2″");
  });
  it("says when a sheet has run out", () => {
    expect(stockFacts({ ...acrylic, thicknessesMm: [] }, "mm").amount).toBe("none on hand");
  });
});
