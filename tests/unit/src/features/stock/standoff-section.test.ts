import { describe, expect, it } from "vitest";
import { standardHardware } from "#shared/materials/standard-stock.ts";
import type { Hardware } from "#shared/mockup/document.ts";
import { asKind, blankHardware } from "@/features/stock/model/blank-entry.ts";
import { measureIn, measuresOf, withMeasure } from "@/features/stock/model/measures.ts";
import { digitWidth, layOutSection } from "@/features/stock/model/section-layout.ts";
import { standoffSection } from "@/features/stock/model/standoff-section.ts";

const kinds: readonly Hardware["kind"][] = ["capStud", "throughScrew", "blindStud", "edgeGrip"];
const rooms = [
  { width: 300, tallest: 150, unit: "mm" },
  { width: 300, tallest: 150, unit: "in" },
  { width: 600, tallest: 200, unit: "mm" },
] as const;

/** What balloon and figure of a dimension cover. */
const labelBoxes = (laid: ReturnType<typeof layOutSection>) =>
  laid.dimensions.map(({ balloon, text }) => ({
    left: balloon.x - 10,
    right: balloon.x + 10 + (text === "" ? 0 : 4 + text.length * digitWidth),
    top: balloon.y - 10,
    bottom: balloon.y + 10,
  }));

describe.each(standardHardware)("$name in section", (hardware) => {
  it("has every measure of the form with the form's number, once", () => {
    const { dimensions } = standoffSection(hardware);
    const inForm = measuresOf(hardware).filter(({ field }) => measureIn(hardware, field) !== 0);
    expect(dimensions.map(({ number, field }) => [number, field])).toEqual(
      inForm.map(({ number, field }) => [number, field]),
    );
  });

  it("measures what it says: each dimension is as long as its figure", () => {
    for (const { from, to, mm, label } of standoffSection(hardware).dimensions) {
      expect(to - from, label).toBeCloseTo(mm ?? Number.NaN, 9);
    }
  });

  it.each(rooms)("keeps its labels apart and inside, at $width px in $unit", (room) => {
    const laid = layOutSection(standoffSection(hardware), room);
    const boxes = labelBoxes(laid);
    for (const [index, a] of boxes.entries()) {
      expect(a.left).toBeGreaterThanOrEqual(0);
      expect(a.right).toBeLessThanOrEqual(room.width + 0.5);
      expect(a.bottom).toBeLessThanOrEqual(laid.height);
      for (const b of boxes.slice(index + 1)) {
        const meet = a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
        expect(meet, `${JSON.stringify(a)} lies on ${JSON.stringify(b)}`).toBe(false);
      }
    }
  });
});

describe("a standoff that is being written", () => {
  it.each(kinds)("of kind %s is drawn before anything is written, without figures", (kind) => {
    const laid = layOutSection(standoffSection(blankHardware(kind)), rooms[0]);
    expect(laid.bodies.length).toBeGreaterThan(2);
    expect(laid.dimensions.map(({ text }) => text).join("")).toBe("");
  });

  it.each(kinds.flatMap((kind) => [0, -3, 1e9, Number.NaN].map((mm) => ({ kind, mm }))))(
    "of kind $kind stays drawable with $mm in every field",
    ({ kind, mm }) => {
      const blank = blankHardware(kind);
      const written = measuresOf(blank).reduce((one, { field }) => withMeasure(one, field, mm), blank);
      const laid = layOutSection(standoffSection(written), rooms[0]);
      const numbers = [
        laid.height,
        ...laid.dimensions.flatMap(({ balloon, line }) => [balloon.x, line.from.x, line.to.y]),
      ];
      expect(numbers.every(Number.isFinite)).toBe(true);
      expect(laid.bodies.every(({ points }) => !points.includes("NaN"))).toBe(true);
    },
  );

  it("keeps what both kinds have when its kind is chosen anew", () => {
    const barrel = standardHardware.find(({ kind }) => kind === "capStud");
    if (!barrel) throw new Error("The usual list has a barrel with a cap.");
    const grip = asKind(barrel, "edgeGrip");
    expect(grip).toMatchObject({
      kind: "edgeGrip",
      name: barrel.name,
      barrelDiameter: barrel.barrelDiameter,
      floorHole: 4,
      slotWidth: null,
    });
    expect(grip).not.toHaveProperty("capDiameter");
  });

  it("has no spacer's measures on a bare stud, and no cap's without one", () => {
    const bare = { ...blankHardware("blindStud"), barrelLength: 0 };
    expect(measuresOf(bare).map(({ field }) => field)).toEqual(["studLength", "studDiameter"]);
    const capless = { ...blankHardware("throughScrew"), cap: null };
    expect(measuresOf(capless).map(({ number }) => number)).toEqual([1, 2, 3, 4]);
  });
});
