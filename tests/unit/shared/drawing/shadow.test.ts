import { describe, expect, it } from "vitest";
import { penumbraMm, shadowOffsetMm } from "#shared/drawing/light.ts";
import { shadowItem, shadowPlane } from "#shared/drawing/shadow.ts";
import type { Caster } from "#shared/drawing/shadow-sweep.ts";
import type { Box, Region } from "#shared/geometry/path.ts";

const receiver: Box = { x: 0, y: 0, width: 200, height: 200 };
const square = (x: number, y: number, side: number): Region => [
  [
    { x, y },
    { x: x + side, y },
    { x: x + side, y: y + side },
    { x, y: y + side },
  ],
];
const plate: Caster = { region: square(60, 60, 80), bottom: 30, top: 33 };

/** Opacities along a straight line through the plane, 0 to 1, with their places in mm. */
function profile(plane: NonNullable<ReturnType<typeof shadowPlane>>, axis: "x" | "y", at: number) {
  const cell = plane.box.width / plane.width;
  const count = axis === "x" ? plane.width : plane.height;
  return Array.from({ length: count }, (_, index) => {
    const column = axis === "x" ? index : Math.floor((at - plane.box.x) / cell);
    const row = axis === "x" ? Math.floor((at - plane.box.y) / cell) : index;
    const place = (axis === "x" ? plane.box.x : plane.box.y) + (index + 0.5) * cell;
    return { place, value: (plane.pixels[row * plane.width + column] ?? 0) / 255 };
  });
}

/** Middle and standard deviation of one rising or falling edge of a profile, from its slope. */
function edgeOf(points: readonly { place: number; value: number }[], from: number, to: number) {
  const inside = points.filter(({ place }) => place >= from && place <= to);
  let weight = 0;
  let sum = 0;
  let squares = 0;
  for (const [index, { place, value }] of inside.entries()) {
    const before = inside[index - 1];
    if (!before) continue;
    const slope = Math.abs(value - before.value);
    const middle = (place + before.place) / 2;
    weight += slope;
    sum += slope * middle;
    squares += slope * middle * middle;
  }
  const mean = sum / weight;
  return { middle: mean, deviation: Math.sqrt(Math.max(0, squares / weight - mean * mean)) };
}

function planeOf(
  casters: readonly Caster[],
  light: { azimuth: number; elevation: number; angularSize: number },
  level = 20,
) {
  const plane = shadowPlane({ light, level, receivers: [receiver], casters });
  if (!plane) throw new Error("No shadow was thrown.");
  return plane;
}

describe("a plate's shadow", () => {
  const light = { azimuth: 0, elevation: 50, angularSize: 0.25 };
  const height = plate.top - 20;
  const down = profile(planeOf([plate], light), "y", 100);

  it("ends where the edge's own ray meets the board: below, moved by the top's offset", () => {
    expect(edgeOf(down, 130, 180).middle).toBeCloseTo(140 + shadowOffsetMm(height, light), 0.7);
  });

  it("starts above at the offset of the back: the plate is swept from its back to its face", () => {
    expect(edgeOf(down, 50, 90).middle).toBeCloseTo(60 + shadowOffsetMm(plate.bottom - 20, light), 0.7);
  });

  it("is as soft along the fall as a half-shadow of that width: its deviation is width / √12", () => {
    const expected = penumbraMm(height, light).along / Math.sqrt(12);
    expect(Math.abs(edgeOf(down, 120, 190).deviation / expected - 1)).toBeLessThan(0.02);
  });

  it("is less soft across the fall, by sin ε", () => {
    const across = profile(planeOf([plate], light), "x", 110);
    const expected = penumbraMm(height, light).across / Math.sqrt(12);
    const left = edgeOf(across, 40, 80);
    expect(Math.abs(left.deviation / expected - 1)).toBeLessThan(0.02);
    expect(left.middle).toBeCloseTo(60, 0.7);
  });

  it("is full in its middle", () => {
    expect(down.find(({ place }) => place > 100)?.value).toBe(1);
  });

  it.each([37, 215, 320])("falls away from light at %d°, wherever that is", (azimuth) => {
    const slanting = { azimuth, elevation: 45, angularSize: 0.1 };
    const plane = planeOf([{ region: square(90, 90, 20), bottom: 40, top: 40.01 }], slanting);
    const cell = plane.box.width / plane.width;
    let [sum, x, y] = [0, 0, 0];
    for (const [index, value] of plane.pixels.entries()) {
      sum += value;
      x += value * (plane.box.x + ((index % plane.width) + 0.5) * cell);
      y += value * (plane.box.y + (Math.floor(index / plane.width) + 0.5) * cell);
    }
    const radians = (azimuth * Math.PI) / 180;
    expect(x / sum).toBeCloseTo(100 - Math.sin(radians) * 20, 0.7);
    expect(y / sum).toBeCloseTo(100 + Math.cos(radians) * 20, 0.7);
    // The same light is taken away, blurred or not: 20 by 20 mm.
    expect((sum / 255) * cell * cell).toBeCloseTo(400, -0.7);
  });
});

describe("cutting by level", () => {
  const light = { azimuth: 0, elevation: 45, angularSize: 0.02 };

  it("gives a level nothing from what lies below it", () => {
    expect(shadowPlane({ light, level: 33, receivers: [receiver], casters: [plate] })).toBeNull();
  });

  it("sweeps a post that starts below the level from the level up", () => {
    const post: Caster = { region: square(90, 90, 10), bottom: 0, top: 40 };
    const points = profile(planeOf([post], light, 20), "y", 95);
    expect(edgeOf(points, 80, 95).middle).toBeCloseTo(90, 0.7);
    expect(edgeOf(points, 100, 140).middle).toBeCloseTo(120, 0.7);
  });

  it("does not darken twice where two casters hide the same light", () => {
    const lower: Caster = { region: square(60, 60, 80), bottom: 24, top: 27 };
    const both = planeOf([plate, lower], light);
    expect(Math.max(...both.pixels)).toBe(255);
    const upper = profile(both, "x", 110).find(({ place }) => place > 100)?.value;
    expect(upper).toBe(1);
  });

  it("shows light through a hole", () => {
    const holed: Caster = { region: [...square(60, 60, 80), ...square(85, 70, 30)], bottom: 30, top: 30.01 };
    const points = profile(planeOf([holed], light), "y", 100);
    expect(points.find(({ place }) => place > 95)?.value).toBe(0);
    expect(points.find(({ place }) => place > 125)?.value).toBe(1);
  });
});

describe("shadowItem", () => {
  const light = { azimuth: 320, elevation: 52, angularSize: 0.2 };

  it("stays on its receiver, within a cell", () => {
    const item = shadowItem({
      light,
      level: 20,
      receivers: [{ x: 50, y: 50, width: 60, height: 60 }],
      casters: [plate],
    });
    const { x = 0, y = 0, width = 0, height = 0 } = item?.box ?? {};
    expect(x).toBeGreaterThanOrEqual(50);
    expect(y).toBeGreaterThanOrEqual(50);
    expect(x + width).toBeGreaterThan(110);
    expect(x + width).toBeLessThan(110.6);
    expect(y + height).toBeLessThan(110.6);
  });

  it("has the same bytes each time", () => {
    const options = { light, level: 20, receivers: [receiver], casters: [plate] };
    expect(shadowItem(options)).toEqual(shadowItem(options));
  });

  it("of light from straight ahead is no wider than the half-shadow's tail", () => {
    const ahead = { azimuth: 0, elevation: 90, angularSize: 0.1 };
    const plane = planeOf([plate], ahead);
    expect(plane.box.x).toBeGreaterThan(58);
    expect(edgeOf(profile(plane, "x", 100), 58, 64).middle).toBeCloseTo(60, 0.7);
  });
});

describe("a shadow of no sign that is ever built", () => {
  const wide = square(-20_000, -20_000, 40_000);
  const cellOf = (casters: readonly Caster[], angularSize: number, width: number): number => {
    const light = { azimuth: 45, elevation: 10, angularSize };
    const plane = shadowPlane({ light, level: 18, receivers: [{ x: 0, y: 0, width, height: 20 }], casters });
    if (!plane) throw new Error("No shadow was thrown.");
    return plane.box.width / plane.width;
  };
  const sigmaMm = (height: number, angularSize: number, way: "along" | "across"): number =>
    penumbraMm(height, { azimuth: 45, elevation: 10, angularSize })[way] / Math.sqrt(12);

  it.each([
    {
      what: "a small board under a plate and a metre behind a wall, by a large lamp",
      width: 20,
      tops: [21, 1018],
      size: 1,
    },
    { what: "a board as long as a house and as narrow as a finger", width: 10_000, tops: [33], size: 0.01 },
  ])("is drawn coarsely, since its mask has twelve million cells at most: on $what", ({ width, tops, size }) => {
    const casters = tops.map((top): Caster => ({ region: wide, bottom: top - 3, top }));
    // In the light's axes the board takes (width + height) / √2 each way, and the blur three sigma on both sides.
    const side = (width + 20) / Math.SQRT2 + 6 * sigmaMm(Math.max(...tops) - 18, size, "along");
    expect(cellOf(casters, size, width)).toBeCloseTo(side / Math.sqrt(12e6), 5);
  });

  it("is drawn as coarsely as its least blur allows", () => {
    const cell = cellOf([{ region: wide, bottom: 1000, top: 1018 }], 1, 20);
    expect(cell).toBeCloseTo(sigmaMm(1000, 1, "across") / 20, 5);
  });
});
