import { describe, expect, it } from "vitest";
import { flattenPath } from "#shared/geometry/flatten.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { liesWhollyOn } from "#shared/hardware/cap-footprint.ts";
import { edgeOverlapMm, slotPlayMm } from "#shared/hardware/edge-grip.ts";
import { headAboveFloorMm } from "#shared/hardware/grip.ts";
import { nearestPlace } from "#shared/hardware/nearest-place.ts";
import { overPanel } from "#shared/hardware/over-panel.ts";
import { nearestGauge, woodScrewDiameterMm } from "#shared/materials/wood-screws.ts";
import { buildCapStud, buildHardware } from "../../../support/build-sign.ts";

const panel = flattenPath(rectanglePath({ x: 0, y: 0, width: 200, height: 100 }));

it("a slot is wider than the sheet by this much at both ends of its tolerance", () => {
  // Cast 4.5 mm measures 3.65 to 5.35 (ISO 7823-1).
  const { thickest, thinnest } = slotPlayMm(5.5, { nominal: 4.5, least: 3.65, most: 5.35 });
  expect(thickest).toBeCloseTo(0.15, 9);
  expect(thinnest).toBeCloseTo(1.85, 9);
});

it.each([
  { x: -3, overlap: 5 },
  { x: -8, overlap: 0 },
  { x: -10, overlap: -2 },
  { x: 2, overlap: 10 },
])("a holder of 16 mm with its middle at $x reaches $overlap over the edge at 0", ({ x, overlap }) => {
  expect(edgeOverlapMm(16, panel, { x, y: 50 })).toBeCloseTo(overlap, 9);
});

it.each([
  { countersunk: true, head: "flat", stands: 0 },
  { countersunk: false, head: "flat", stands: 2 },
  { countersunk: true, head: "pan", stands: 2 },
  { countersunk: false, head: "round", stands: 2 },
] as const)(
  "a $head head, countersunk $countersunk, stands $stands above the floor",
  ({ countersunk, head, stands }) => {
    expect(headAboveFloorMm(countersunk, { head, headHeight: 2 })).toBe(stands);
  },
);

it.each([4, 6, 8, 10, 14])("the nearest gauge to a No. %d is itself, and half a gauge either way too", (gauge) => {
  const diameter = woodScrewDiameterMm(gauge);
  expect([nearestGauge(diameter), nearestGauge(diameter - 0.15), nearestGauge(diameter + 0.15)]).toEqual([
    gauge,
    gauge,
    gauge,
  ]);
  expect(nearestGauge(0)).toBe(0);
});

describe("what lies over the panel", () => {
  it.each([
    { hardware: buildCapStud(), over: { what: "cap", diameter: 15, heightMm: 3 } },
    { hardware: buildHardware("throughScrew"), over: { what: "cap", diameter: 14, heightMm: 4 } },
    { hardware: buildHardware("blindStud"), over: null },
    // 20.5 high, the face 15 above the wood.
    { hardware: buildHardware("edgeGrip"), over: { what: "grip", diameter: 16, heightMm: 5.5 } },
  ])("of $hardware.name is $over", ({ hardware, over }) => expect(overPanel(hardware, 15)).toEqual(over));

  it("of a screw without a cap is its head", () => {
    expect(overPanel(buildHardware("throughScrew", { cap: null }), 15)?.what).toBe("head");
  });
});

describe("the nearest place", () => {
  it("is found to a tenth", () => {
    expect(nearestPlace({ x: 3, y: 50 }, ({ x }) => x >= 12.34)).toEqual({ x: 12.4, y: 50 });
  });
  it("is none where nothing fits within 80 mm", () => {
    expect(nearestPlace({ x: 0, y: 0 }, ({ x }) => x > 81)).toBeNull();
  });
});

describe("a cap", () => {
  const ringed = [...panel, ...flattenPath(rectanglePath({ x: 46, y: 46, width: 8, height: 8 }))];
  it("bridges a hole that is all under it, and no wider one", () => {
    expect(liesWhollyOn({ x: 50, y: 50, diameter: 12 }, ringed)).toBe(true);
    expect(liesWhollyOn({ x: 50, y: 50, diameter: 10 }, ringed)).toBe(false);
    expect(liesWhollyOn({ x: 5, y: 50, diameter: 12 }, panel)).toBe(false);
  });
});
