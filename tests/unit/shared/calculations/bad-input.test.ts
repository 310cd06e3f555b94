import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { movementMismatchMm } from "#shared/bonds/movement-mismatch.ts";
import { bindingCorners, pocketGapMm } from "#shared/bonds/pocket-fit.ts";
import { pocketFloor } from "#shared/bonds/pocket-floor.ts";
import { finishedWoodLrv } from "#shared/colour/finished-wood.ts";
import { lrvOfLightness, luminanceContrast } from "#shared/colour/lrv.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { smallestBox } from "#shared/geometry/smallest-box.ts";
import { fixingLoads, usedShare } from "#shared/hardware/fixing-loads.ts";
import { evenHoles } from "#shared/hardware/hole-proposals.ts";
import { screwLateral } from "#shared/hardware/lateral.ts";
import { nearestDrillMm, pilotHoleMm } from "#shared/hardware/pilot-hole.ts";
import { reachRoom, screwReach } from "#shared/hardware/screw-reach.ts";
import { isWithdrawalSize, screwWithdrawalN } from "#shared/hardware/withdrawal.ts";
import { lettersForDistance, readingDistance, readingEase } from "#shared/legibility/reading-distance.ts";
import { strokeToHeight } from "#shared/legibility/stroke-to-height.ts";
import { visualCharacterHeightMm } from "#shared/legibility/visual-height.ts";
import { seasonalMovementMm } from "#shared/materials/seasonal-movement.ts";
import { dropOuts } from "#shared/pieces/drop-outs.ts";
import { mirrorLine } from "#shared/pieces/mirror-symmetry.ts";
import { nearTwins } from "#shared/pieces/near-twins.ts";
import { smallPieces } from "#shared/pieces/small-pieces.ts";
import { deflectionLimitMm } from "#shared/plates/deflection.ts";
import { pushDeflection } from "#shared/plates/push.ts";
import { sag } from "#shared/plates/sag.ts";
import type { Outcome } from "#shared/units/outcome.ts";

/** Any number that a field, a file or a mistake may bring. */
const any = fc.oneof(
  fc.double(),
  fc.double({ min: -1, max: 1000, noNaN: true }),
  fc.constantFrom(
    0,
    -0,
    Number.NaN,
    Number.POSITIVE_INFINITY,
    Number.NEGATIVE_INFINITY,
    1e308,
    -1e308,
    5e-324,
    1e-9,
    10_000,
    10_001,
  ),
);

/** No number in it that is none. */
function isSound(value: unknown): boolean {
  if (typeof value === "number") return Number.isFinite(value);
  if (typeof value !== "object" || value === null) return value !== undefined;
  return Object.values(value).every(isSound);
}

function expectSound(outcome: Outcome<unknown>): void {
  if (outcome.ok) expect(isSound(outcome.value), JSON.stringify(outcome.value)).toBe(true);
  else expect(outcome.reason.field.length).toBeGreaterThan(0);
}

type Calculate = (...numbers: [number, number, number, number, number, number]) => Outcome<unknown>;

const band = (nominal: number, least: number, most: number) => ({ nominal, least, most });

const calculateAll: Readonly<Record<string, Calculate>> = {
  "pilot hole": (a) => pilotHoleMm(a, "softwood"),
  drill: (a, b) => nearestDrillMm(a, b > 0 ? "mm" : "in"),
  withdrawal: (gravity, diameter, threadInWood) => screwWithdrawalN({ gravity, diameter, threadInWood }),
  lateral: (gravity, diameter, penetration) => screwLateral({ gravity, hardness: "hardwood", diameter, penetration }),
  loads: (weightN, centroidOff, fixings, upper, apart) =>
    fixingLoads({ weightN, centroidOff, rows: { fixings, upper, apart } }),
  "cap stud": (length, floor, headHeight) =>
    screwReach({ kind: "capStud", length, floor, seat: "flat on a plain floor", headHeight }),
  "through screw": (length, washer, spacer, a, b, c) =>
    screwReach({ kind: "throughScrew", length, washer, spacer, panel: band(a, b, c) }),
  "blind stud": (length, offset) => screwReach({ kind: "blindStud", length, offset }),
  brad: (length) => screwReach({ kind: "brad", length }),
  room: (slat, substrate, sanding, skin) => {
    const at = band(10, 9, 11);
    return reachRoom({ point: at, opened: at }, { slat, substrate, sanding, skin });
  },
  "sag on points": (modulus, thickness, poisson, width, height, load) =>
    sag({ modulus, thickness, poisson }, { kind: "four points", width, height }, load),
  "sag on edges": (modulus, thickness, poisson, width, height, load) =>
    sag({ modulus, thickness, poisson }, { kind: "edges", width, height }, load),
  "sag of a strip": (modulus, thickness, poisson, reach, load) =>
    sag({ modulus, thickness, poisson }, { kind: "strip", reach }, load),
  push: (modulus, thickness, poisson, width, height, force) =>
    pushDeflection({ modulus, thickness, poisson }, { width, height }, force),
  limit: (spacing) => deflectionLimitMm(spacing),
  mismatch: (longest, a, b, c, temperatureK, moisturePoints) =>
    movementMismatchMm({
      longest,
      one: { perK: a, perPoint: b },
      other: { perK: c, perPoint: 0 },
      temperatureK,
      moisturePoints,
    }),
  floor: (a, b, c, depth, tolerance, share) => pocketFloor(band(a, b, c), depth, { tolerance, share }),
  gap: (clearance, pieceKerf, pocketKerf) => pocketGapMm({ clearance, pieceKerf, pocketKerf }),
  season: (dimension, perPoint, from, to, grainAngle) =>
    seasonalMovementMm({ dimension, perPoint, from, to, grainAngle }),
  distance: (height) => readingDistance(height),
  letters: (distance) => lettersForDistance(distance),
  ease: (height, distance) => readingEase(height, distance),
  "visual height": (baseline, distance) => visualCharacterHeightMm(baseline, distance),
  "used share": (load, allowable) => usedShare(load, allowable),
  stroke: (stroke, height) => strokeToHeight(stroke, height),
  reflectance: (lightness) => lrvOfLightness(lightness),
  contrast: (one, other) => luminanceContrast(one, other),
  finish: (L, a, b, stain, strength) =>
    finishedWoodLrv({ L, a, b }, [
      { kind: "stain", colour: { L: stain, a, b }, strength },
      { kind: "clear, oil or shellac" },
    ]),
};

describe.each(Object.entries(calculateAll))("%s", (_, calculate) => {
  it("gives a sound figure or names what is wrong, for any numbers", () => {
    fc.assert(
      fc.property(fc.tuple(any, any, any, any, any, any), (numbers) => expectSound(calculate(...numbers))),
      { numRuns: 400 },
    );
  });

  it("refuses what is no number", () => {
    const { NaN: none } = Number;
    expect(calculate(none, none, none, none, none, none)).toMatchObject({ ok: false });
  });
});

it("a size of screw is known or not, for any numbers", () => {
  fc.assert(
    fc.property(any, any, (gauge, length) => {
      expect([true, false]).toContain(isWithdrawalSize(gauge, length));
    }),
  );
});

describe("outlines of any kind", () => {
  let kernel: Kernel;
  beforeAll(async () => {
    kernel = await loadKernel();
  });
  const coordinate = fc.oneof(fc.integer({ min: -50, max: 50 }), fc.double({ min: -1000, max: 1000, noNaN: true }));
  const point = fc.record({ x: coordinate, y: coordinate });
  /** Crossing, doubled back, empty, in a line. */
  const outline = fc.array(fc.array(point, { maxLength: 9 }), { maxLength: 3 });

  it("have boxes, lines, twins and islands that are sound, or none", () => {
    fc.assert(
      fc.property(outline, outline, fc.double({ min: 0.1, max: 5, noNaN: true }), (rings, others, size) => {
        const region = kernel.union(rings, "evenodd");
        const other = kernel.union(others, "evenodd");
        const pieces = [
          { id: "one", region },
          { id: "other", region: other },
        ];
        for (const found of [
          smallestBox(rings),
          mirrorLine(region, kernel),
          nearTwins(pieces, kernel),
          dropOuts(region),
          smallPieces(pieces),
          bindingCorners(region, 0.1, size, kernel),
          evenHoles(region, { edge: size, apart: size, level: [] }, size * 50),
        ]) {
          expect(isSound(found), JSON.stringify(found)).toBe(true);
        }
      }),
      { numRuns: 120 },
    );
  });
});
