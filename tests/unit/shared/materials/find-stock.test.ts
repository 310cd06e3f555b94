import { describe, expect, it } from "vitest";
import { findEntry, hasThickness, nearestSheet, nearestThickness } from "#shared/materials/find-stock.ts";
import { standardAcrylics } from "#shared/materials/standard-stock.ts";

describe("an entry", () => {
  const entries = [
    { stockId: "one", name: "Dusk" },
    { stockId: null, name: "Midnight" },
    { stockId: "two", name: "Midnight" },
  ];
  const same = (entry: (typeof entries)[number]) => entry;

  it.each([
    { wanted: { stockId: "two", name: "Dusk" }, index: 2 },
    { wanted: { stockId: null, name: "Midnight" }, index: 1 },
    { wanted: { stockId: "gone", name: "Dusk" }, index: 0 },
    { wanted: { stockId: "gone", name: "Noon" }, index: null },
  ])("of $wanted is found by its id before its name: $index", ({ wanted, index }) => {
    expect(findEntry(entries, wanted, same)).toBe(index === null ? null : entries[index]);
  });
});

it.each([
  { thickness: 4, nearest: 4.5 },
  { thickness: 3.75, nearest: 3 },
  { thickness: 99, nearest: 6 },
])("nearest to $thickness of 6, 3 and 4.5 is $nearest", ({ thickness, nearest }) => {
  expect(nearestThickness([6, 3, 4.5], thickness)).toBe(nearest);
});

it("no thickness is nearest to anything, and none is there", () => {
  expect(nearestThickness([], 3)).toBeNull();
  expect(hasThickness([], 3)).toBe(false);
  expect(hasThickness([3, 4.5], 4.54)).toBe(true);
  expect(hasThickness([3, 4.5], 4.56)).toBe(false);
});

it.each([
  { colour: "#27314F", look: "opaque", thicknessMm: 4.5, name: "Midnight", comesIn: 4.5 },
  { colour: "#1E1E1F", look: "opaque", thicknessMm: 10, name: "Soot", comesIn: 10 },
  { colour: "#27314F", look: "opaque", thicknessMm: 10, name: "Soot", comesIn: 10 },
  { colour: "#27314F", look: "opaque", thicknessMm: 20, name: "Midnight", comesIn: 6 },
  { colour: "#000000", look: "clear", thicknessMm: 5, name: "Clear, extruded", comesIn: 5 },
] as const)("a $look sheet of $colour in $thicknessMm mm: $name in $comesIn mm", ({ name, comesIn, ...wanted }) => {
  expect(nearestSheet(wanted, standardAcrylics)).toMatchObject({ stock: { name }, thicknessMm: comesIn });
});

it("nothing looks like what no entry looks like", () => {
  const opaque = standardAcrylics.filter(({ acrylic }) => acrylic.look === "opaque");
  expect(nearestSheet({ colour: "#FFFFFF", look: "mirror", thicknessMm: 3 }, opaque)).toBeNull();
  expect(nearestSheet({ colour: "#FFFFFF", look: "opaque", thicknessMm: 3 }, [])).toBeNull();
});
