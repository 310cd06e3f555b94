import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { sheetMassG, woodDensityKgM3 } from "#shared/materials/density.ts";
import { sheetBand } from "#shared/materials/sheet-tolerance.ts";
import { standardAcrylics, standardWoods } from "#shared/materials/standard-stock.ts";
import { checkReference } from "../support/check-reference.ts";

const rows = (name: string) =>
  readFileSync(new URL(`../fixtures/reference/${name}`, import.meta.url), "utf8")
    .split("\n")
    .filter((line) => line && !line.startsWith("#"))
    .slice(1);

// ISO 7823-1: ±(0.4 + 0.1 t).
it.each(
  rows("pmma-thickness-tolerance.csv").map((line) => {
    const [thickness = 0, tolerance = 0, least = 0, most = 0] = line.split(",").map(Number);
    return { thickness, tolerance, least, most };
  }),
)("cast acrylic of $thickness mm measures $least to $most mm", ({ thickness, least, most }) => {
  const band = sheetBand("cast", thickness);
  expect(band.nominal).toBe(thickness);
  const source = "ISO 7823-1";
  checkReference({ what: `cast ${thickness} mm, least`, source, expected: least, got: band.least, within: 1e-9 });
  checkReference({ what: `cast ${thickness} mm, most`, source, expected: most, got: band.most, within: 1e-9 });
});

// ISO 7823-2: ±10 % under 3 mm, ±5 % from 3 mm.
it.each([
  { thickness: 2, least: 1.8, most: 2.2 },
  { thickness: 2.99, least: 2.691, most: 3.289 },
  { thickness: 3, least: 2.85, most: 3.15 },
  { thickness: 10, least: 9.5, most: 10.5 },
])("extruded acrylic of $thickness mm measures $least to $most mm", ({ thickness, least, most }) => {
  const band = sheetBand("extruded", thickness);
  const source = "ISO 7823-2";
  checkReference({ what: `extruded ${thickness} mm, least`, source, expected: least, got: band.least, within: 1e-9 });
  checkReference({ what: `extruded ${thickness} mm, most`, source, expected: most, got: band.most, within: 1e-9 });
});

it("a foil thinner than its tolerance can't be thinner than nothing", () => {
  expect(sheetBand("cast", 0.3).least).toBe(0);
});

// ASTM D792: 1.19 g/cm³. A square metre of 3 mm weighs 3.57 kg, of 6 mm 7.14 kg.
it.each([
  { thickness: 3, kg: 3.57 },
  { thickness: 6, kg: 7.14 },
])("a square metre of $thickness mm acrylic weighs $kg kg", ({ thickness, kg }) => {
  const density = standardAcrylics[0]?.acrylic.densityKgM3 ?? 0;
  const got = sheetMassG(1_000_000, thickness, density) / 1000;
  checkReference({
    what: `a square metre of ${thickness} mm, kg`,
    source: "ASTM D792",
    expected: kg,
    got,
    within: 1e-9,
  });
});

// Forest Products Laboratory, Wood Handbook, GTR-190 and GTR-282, table 5-3; density at 12 % moisture by the handbook's
// chapter 4.
const species = rows("fpl-specific-gravity.csv").map((line) => {
  const [name = "", , , , gravity = "", density = ""] = line.replace(/"([^",]+), ([^"]+)"/, "$1 $2").split(",");
  return { name, gravity: Number(gravity), density: Number(density) };
});

it.each(species)("$name of G $gravity weighs $density kg/m³ at 12 %", ({ name, gravity, density }) => {
  const source = "Wood Handbook GTR-190, table 5-3";
  const got = woodDensityKgM3(gravity, 12);
  checkReference({ what: `density of ${name}, kg/m³`, source, expected: density, got, within: 0.5 });
});

it.each([
  { stock: "Eastern white pine", row: "eastern white pine" },
  { stock: "Ponderosa pine", row: "ponderosa pine" },
  { stock: "Black walnut", row: "black walnut" },
  { stock: "Hard maple", row: "sugar (hard) maple" },
  { stock: "Black cherry", row: "black cherry" },
  { stock: "Red oak", row: "northern red oak" },
  { stock: "White ash", row: "white ash" },
  { stock: "Basswood", row: "American basswood" },
])("$stock of the stock list has the handbook's gravity", ({ stock, row }) => {
  const listed = species.find(({ name }) => name === row);
  expect(listed).toBeDefined();
  expect(standardWoods.find(({ wood }) => wood.name === stock)?.wood.gravity).toBe(listed?.gravity);
});
