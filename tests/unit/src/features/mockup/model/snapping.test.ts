import { describe, expect, it } from "vitest";
import { barrelLengths, catchBarrel, nextBarrel, typedReachMm } from "@/features/mockup/model/snapping.ts";
import { barrel } from "../sample-mockup.ts";

const brassFinish = "#C8993A";
const stock = [
  barrel(25),
  barrel(12),
  barrel(19),
  barrel(19, { name: "Brass 19", finish: brassFinish }),
  barrel(19, { name: "Thin brass 19", finish: brassFinish, barrelDiameter: 13 }),
];

describe("raising a layer", () => {
  it("knows each barrel length in stock once, shortest first", () => {
    expect(barrelLengths(stock)).toEqual([12, 19, 25]);
  });

  it.each([
    { offset: 18.2, caught: 19 },
    { offset: 23.6, caught: 25 },
    { offset: 22, caught: 22 },
    { offset: 0, caught: 0 },
  ])("to $offset mm ends at $caught mm when barrels catch within 1.5 mm", ({ offset, caught }) => {
    expect(catchBarrel(offset, { stock, current: barrel(12), reachMm: 1.5 }).offset).toBe(caught);
  });

  it("takes the hardware most like what the layer had: the barrel first, then the finish", () => {
    const taken = (current: ReturnType<typeof barrel>) =>
      catchBarrel(19, { stock, current, reachMm: 1 }).hardware?.name;
    expect(taken(barrel(25, { finish: brassFinish }))).toBe("Brass 19");
    expect(taken(barrel(25, { finish: brassFinish, barrelDiameter: 13 }))).toBe("Thin brass 19");
    expect(taken(barrel(25))).toBe("Standoff 15 × 19");
  });

  it("leaves the hardware alone between barrels", () => {
    expect(catchBarrel(22, { stock, current: barrel(19), reachMm: 1.5 }).hardware).toBeUndefined();
  });

  it.each([
    { typed: 12.7, unit: "in", barrelMm: 12 },
    { typed: 19.05, unit: "in", barrelMm: 19 },
    { typed: 25.4, unit: "in", barrelMm: 25 },
    { typed: 22.225, unit: "in", barrelMm: undefined },
    { typed: 19.2, unit: "mm", barrelMm: 19 },
    { typed: 25.4, unit: "mm", barrelMm: undefined },
  ] as const)("means the barrel that reads alike when $typed mm is typed in $unit", ({ typed, unit, barrelMm }) => {
    const caught = catchBarrel(typed, { stock, current: barrel(19), reachMm: typedReachMm[unit] });
    expect(caught.hardware?.barrelLength).toBe(barrelMm);
  });

  it("steps to the next barrel up and down", () => {
    expect(nextBarrel(19, stock, "up")).toBe(25);
    expect(nextBarrel(19, stock, "down")).toBe(12);
    expect(nextBarrel(20, stock, "down")).toBe(19);
    expect(nextBarrel(25, stock, "up")).toBeUndefined();
  });
});
