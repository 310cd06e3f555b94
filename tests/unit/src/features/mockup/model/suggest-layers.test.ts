import { describe, expect, it } from "vitest";
import type { StockItem } from "#shared/contracts/stock.ts";
import {
  holdChoices,
  isSameStock,
  stockChoices,
  thicknessChoices,
  withCurrent,
} from "@/features/mockup/model/stock-choices.ts";
import { suggestHold, suggestLayers } from "@/features/mockup/model/suggest-layers.ts";
import { barrel, brass, cement, chalk, epoxy, midnight, pine } from "../sample-mockup.ts";

const id = (digit: number) => `00000000-0000-4000-8000-00000000000${digit}`;
const kept = { version: 1, retiredAt: null };
const items: StockItem[] = [
  { ...kept, id: id(1), name: midnight.name, kind: "acrylic", acrylic: midnight, thicknessesMm: [6, 4.5], sheets: [] },
  { ...kept, id: id(2), name: brass.name, kind: "acrylic", acrylic: brass, thicknessesMm: [2, 3], sheets: [] },
  {
    ...kept,
    id: id(3),
    name: "Clear",
    kind: "acrylic",
    acrylic: { ...chalk, name: "Clear", colour: "#C99A33", look: "clear" },
    thicknessesMm: [3],
    sheets: [],
  },
  { ...kept, id: id(4), name: "Long", kind: "hardware", hardware: barrel(25), quantity: 4 },
  { ...kept, id: id(5), name: "Short", kind: "hardware", hardware: barrel(12), quantity: 4 },
  { ...kept, id: id(6), name: cement.name, kind: "adhesive", adhesive: cement },
  { ...kept, id: id(7), name: epoxy.name, kind: "adhesive", adhesive: epoxy },
  { ...kept, id: id(8), name: pine.name, kind: "wood", wood: pine, thicknessesMm: [18] },
];
const stock = stockChoices(items);

describe("stock to choose from", () => {
  it("carries the id of its row, thicknesses and barrels from the smallest up", () => {
    expect(stock.acrylics[0]).toMatchObject({ acrylic: { stockId: id(1) }, thicknessesMm: [4.5, 6] });
    expect(stock.hardware.map(({ barrelLength }) => barrelLength)).toEqual([12, 25]);
  });

  it("keeps what a drawing has when the stock has it no more, and does not list it twice when it has", () => {
    const sheets = stock.acrylics.map(({ acrylic }) => acrylic);
    expect(withCurrent(sheets, chalk)[0]).toBe(chalk);
    expect(withCurrent(sheets, brass)).toBe(sheets);
    expect(isSameStock(brass, { ...brass, stockId: id(2) })).toBe(true);
    expect(isSameStock(brass, { ...brass, colour: "#C8993B" })).toBe(false);
    expect(thicknessChoices([3, 6], 4.5)).toEqual([3, 4.5, 6]);
  });

  it("offers every way to hold a layer, with the present one among them", () => {
    const choices = holdChoices(stock, { kind: "standoff", hardware: barrel(19), offset: 19, holes: [] });
    expect(
      choices.map((choice) =>
        choice.kind === "standoff" ? choice.hardware.barrelLength : `${choice.kind} ${choice.adhesive.name}`,
      ),
    ).toEqual([
      "bond Bodied cement",
      "bond Two-part epoxy",
      19,
      12,
      25,
      "pocket Bodied cement",
      "pocket Two-part epoxy",
    ]);
  });
});

describe("layers proposed for an artwork", () => {
  it("come largest first, each from the nearest opaque sheet, in 3 mm or the next thicker it comes in", () => {
    const layers = suggestLayers(
      [
        { colour: "#C99A33", pieces: 4, areaMm2: 900 },
        { colour: "#262F4F", pieces: 1, areaMm2: 50_000 },
      ],
      stock.acrylics,
    );
    expect(layers.map(({ colour, sheet, thickness, match }) => [colour, sheet, thickness, match])).toEqual([
      ["#262F4F", 0, 4.5, "same"],
      // The clear sheet has this very colour, but one sees the wood through it.
      ["#C99A33", 1, 3, "close"],
    ]);
  });

  it("are none without a sheet in stock", () => {
    expect(suggestLayers([{ colour: "#262F4F", pieces: 1, areaMm2: 1 }], [])).toEqual([]);
  });

  it("are bonded with what suits wood, or acrylic", () => {
    expect(suggestHold(stock, "wood")).toBe(1);
    expect(suggestHold(stock, "acrylic")).toBe(0);
    expect(suggestHold({ ...stock, adhesives: [] }, "wood")).toBe(0);
  });
});
