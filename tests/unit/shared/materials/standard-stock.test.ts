import { describe, expect, it } from "vitest";
import { barrelAddsUp } from "#shared/hardware/barrel-offset.ts";
import { capStudGrip } from "#shared/hardware/grip.ts";
import { holeWindow } from "#shared/hardware/hole-window.ts";
import { screwMisfits } from "#shared/hardware/screw-fit.ts";
import { sheetBand } from "#shared/materials/sheet-tolerance.ts";
import {
  standardAcrylics,
  standardAdhesives,
  standardHardware,
  standardScrews,
  standardStandoffs,
  standardWoods,
} from "#shared/materials/standard-stock.ts";
import { hardwareSchema } from "#shared/mockup/hardware-schemas.ts";
import { acrylicSchema, adhesiveSchema, woodSchema } from "#shared/mockup/stock-schemas.ts";

describe("every entry of the stock list passes the document's schema", () => {
  it.each(standardAcrylics.map(({ acrylic }) => acrylic))("$name", (acrylic) => {
    expect(acrylicSchema.parse(acrylic)).toEqual(acrylic);
  });
  it.each(standardWoods.map(({ wood }) => wood))("$name", (wood) => expect(woodSchema.parse(wood)).toEqual(wood));
  it.each(standardHardware)("$name", (hardware) => expect(hardwareSchema.parse(hardware)).toEqual(hardware));
  it.each(standardAdhesives)("$name", (adhesive) => expect(adhesiveSchema.parse(adhesive)).toEqual(adhesive));
});

it("names are used once, and thicknesses go up", () => {
  const names = [
    ...standardAcrylics.map(({ acrylic }) => acrylic.name),
    ...standardWoods.map(({ wood }) => wood.name),
    ...standardHardware.map(({ name }) => name),
    ...standardAdhesives.map(({ name }) => name),
  ];
  expect(new Set(names).size).toBe(names.length);
  for (const { thicknessesMm } of [...standardAcrylics, ...standardWoods]) {
    expect(thicknessesMm.length).toBeGreaterThan(0);
    expect(thicknessesMm).toEqual(thicknessesMm.toSorted((a, b) => a - b));
  }
});

it("standoffs come in two diameters and three lengths, screws in four", () => {
  expect(standardStandoffs.map(({ barrelDiameter, barrelLength }) => `${barrelDiameter} × ${barrelLength}`)).toEqual([
    "15 × 12",
    "15 × 19",
    "15 × 25",
    "19 × 12",
    "19 × 19",
    "19 × 25",
  ]);
  expect(standardScrews.map(({ length }) => length)).toEqual([12, 16, 19, 25, 32, 38, 45]);
});

describe.each(standardStandoffs)("$name", (standoff) => {
  it("has bore and floor that make its length", () => expect(barrelAddsUp(standoff)).toBe(true));

  it.each(standardScrews)("takes $name", (screw) => {
    expect(screwMisfits({ ...standoff, screw })).toEqual([]);
    expect(screw.headHeight).toBeLessThanOrEqual(standoff.floorThickness);
  });

  it("leaves a hole window of 2.5 mm or more before anything moves", () => {
    const window = holeWindow({
      passing: standoff.studDiameter,
      cap: standoff.capDiameter,
      barrel: standoff.barrelDiameter,
      placingError: 0.5,
      movement: 0,
      cover: 1,
    });
    expect(window.upper - window.lower).toBeGreaterThanOrEqual(2.5);
  });

  it("grips a cast sheet of 4.5 mm at both ends of its tolerance", () => {
    const grip = capStudGrip(standoff, sheetBand("cast", 4.5));
    expect(grip.least).toBeGreaterThanOrEqual(grip.needed);
    expect(grip.most).toBeLessThanOrEqual(grip.room);
  });
});

it("the slim standoff has a window up to 9.0 mm: cap 15, stud 5, cover 1", () => {
  const [slim] = standardStandoffs;
  expect(slim).toMatchObject({ capDiameter: 15, barrelDiameter: 15, studDiameter: 5 });
  expect(holeWindow({ passing: 5, cap: 15, barrel: 15, placingError: 0.5, movement: 0, cover: 1 }).upper).toBe(9);
});
