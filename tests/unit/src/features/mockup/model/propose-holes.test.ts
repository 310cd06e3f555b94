import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { rules } from "#shared/dry-fit/index.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { usualOffsetMm } from "#shared/hardware/standoff-parts.ts";
import type { Hardware, Layer, MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { propose } from "@/features/mockup/model/propose-holes.ts";
import {
  buildCapStud,
  buildHardware,
  buildLayer,
  buildSign,
  disc,
  hole,
  plate,
  standoffHold,
} from "../../../../../support/build-sign.ts";
import { inside } from "../sites.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

/** The layer with that key put on standoffs where they are proposed. */
function stand(document: MockupDocument, key: string, hardware: Hardware): MockupDocument {
  const layers = document.layers.map((layer): Layer => {
    if (layer.key !== key) return layer;
    const holes = propose(layer, { hardware, id: key, document, site: inside });
    return { ...layer, hold: { kind: "standoff", hardware, offset: usualOffsetMm(hardware), holes } };
  });
  return { ...document, layers };
}

/** What the dry fit says of where standoffs are, on one layer. */
function faultsOf(document: MockupDocument, key: string): string[] {
  const figures = computeFigures(document, kernel);
  const input = { document, figures, limits: defaultLimits, context: usualContext, kernel };
  return rules
    .filter(({ number }) => [2, 7, 8, 9, 10, 12, 13, 14, 16].includes(number))
    .flatMap(({ check }) => check(input))
    .filter(({ layerKey, severity }) => layerKey === key && severity === "stop")
    .map(({ text }) => text);
}

const holesOf = ({ layers }: MockupDocument, key: string) => {
  const hold = layers.find((layer) => layer.key === key)?.hold;
  return hold?.kind === "standoff" ? hold.holes : [];
};

const kinds: readonly Hardware[] = [
  buildCapStud(),
  buildHardware("throughScrew"),
  buildHardware("blindStud"),
  buildHardware("edgeGrip"),
];
const panel = (rest: Partial<Layer> = {}) =>
  buildLayer("B", [plate("panel", 260, 160, [300, 200])], { thickness: 4.5, ...rest });

describe("places proposed for each kind of hardware", () => {
  it.each(kinds)("of $name are four, and the dry fit has nothing against them", (hardware) => {
    const sign = stand(buildSign([panel()]), "B", hardware);
    expect(holesOf(sign, "B")).toHaveLength(4);
    expect(holesOf(sign, "B").filter(({ fixed }) => fixed)).toHaveLength(1);
    expect(faultsOf(sign, "B")).toEqual([]);
  });

  it("edge grips reach over the upper and the lower edge by their slot's depth", () => {
    const holes = holesOf(stand(buildSign([panel()]), "B", buildHardware("edgeGrip")), "B");
    // Half a holder of 16 less the slot's 5: 3 mm outside the edges at 120 and 280.
    expect(holes.map(({ x, y }) => [x, y])).toEqual([
      [235, expect.closeTo(117, 2)],
      [365, expect.closeTo(117, 2)],
      [235, expect.closeTo(283, 2)],
      [365, expect.closeTo(283, 2)],
    ]);
  });

  it("on a disc edge grips keep to the curve", () => {
    const round = buildSign([buildLayer("B", [disc("d", 90, [300, 200])], { thickness: 4.5 })]);
    const sign = stand(round, "B", buildHardware("edgeGrip"));
    expect(holesOf(sign, "B")).toHaveLength(4);
    for (const { x, y } of holesOf(sign, "B")) expect(Math.hypot(x - 300, y - 200)).toBeCloseTo(93, 0);
    expect(faultsOf(sign, "B")).toEqual([]);
  });

  it("on a bar they stand in a row, the one in the middle fixed", () => {
    const bar = buildSign([buildLayer("B", [plate("bar", 500, 40, [300, 200])], { thickness: 4.5 })]);
    const holes = holesOf(stand(bar, "B", buildCapStud()), "B");
    expect(new Set(holes.map(({ y }) => y))).toEqual(new Set([200]));
    expect(holes.map(({ fixed }) => fixed)).toEqual([false, true, false]);
    expect(holes[1]?.x).toBe(300);
  });
});

it("a bar across the grain has them so near that each has a window", () => {
  const bar = buildSign([buildLayer("B", [plate("bar", 40, 380, [300, 200])], { thickness: 4.5 })]);
  const sign = stand(bar, "B", buildCapStud());
  const ys = holesOf(sign, "B").map(({ y }) => y);
  // 1.5 mm of movement are 151.8 mm across pine (commands.test.ts).
  expect(ys.length).toBeGreaterThanOrEqual(2);
  expect(Math.max(...ys) - Math.min(...ys)).toBeLessThanOrEqual(151.9);
  expect(Math.max(...ys) - Math.min(...ys)).toBeGreaterThan(120);
});

describe("steps", () => {
  /** A border of four strips on the panel, just where its corners are. */
  const border = buildLayer("C", [
    plate("top", 260, 40, [300, 140]),
    plate("low", 260, 40, [300, 260]),
    plate("left", 40, 80, [190, 200]),
  ]);

  it.each(kinds)("under the front of $name are kept off", (hardware) => {
    const sign = stand(buildSign([panel(), border]), "B", hardware);
    expect(holesOf(sign, "B").length).toBeGreaterThan(0);
    // A border right at the edge leaves an edge grip no place; then the dry fit says so.
    if (hardware.kind !== "edgeGrip") expect(faultsOf(sign, "B")).toEqual([]);
  });

  it("under the feet are kept off, whether the panel stands on the board or on a plate", () => {
    const on = (width: number) =>
      buildSign([
        buildLayer("B", [plate("under", width, 300, [300, 200])]),
        buildLayer("C", [plate("panel", 260, 160, [300, 200])], { thickness: 4.5 }),
      ]);
    for (const width of [60, 100, 500]) {
      const sign = stand(on(width), "C", buildCapStud());
      expect(holesOf(sign, "C")).toHaveLength(4);
      expect(faultsOf(sign, "C")).toEqual([]);
    }
  });

  it("feet stay on the board", () => {
    const sign = stand(
      buildSign([buildLayer("B", [plate("panel", 260, 160, [560, 200])], { thickness: 4.5 })]),
      "B",
      buildCapStud(),
    );
    expect(holesOf(sign, "B")).toHaveLength(4);
    for (const { x } of holesOf(sign, "B")) expect(x).toBeLessThanOrEqual(592.5);
  });

  it("a cap keeps off the barrels of a panel that stands on it", () => {
    const upper = buildLayer("C", [plate("upper", 200, 120, [300, 200])], {
      hold: standoffHold([hole("u", 187, 137)], buildCapStud()),
    });
    const sign = stand(buildSign([panel(), upper]), "B", buildCapStud());
    for (const { x, y } of holesOf(sign, "B")) expect(Math.hypot(x - 187, y - 137)).toBeGreaterThanOrEqual(15.4);
  });
});

it("whatever is bonded on a panel, no proposed cap stands on a step as long as there is a place without", () => {
  const badge = fc.record({
    x: fc.integer({ min: 180, max: 420 }),
    y: fc.integer({ min: 130, max: 270 }),
    radius: fc.integer({ min: 4, max: 45 }),
  });
  let placed = 0;
  fc.assert(
    fc.property(fc.array(badge, { maxLength: 5 }), fc.constantFrom(...kinds.slice(0, 3)), (badges, hardware) => {
      const pieces = badges.map(({ x, y, radius }, index) => disc(`b${index}`, radius, [x, y]));
      const sign = stand(buildSign([panel(), buildLayer("C", pieces)]), "B", hardware);
      const faults = faultsOf(sign, "B");
      placed += holesOf(sign, "B").length;
      expect(faults).toEqual([]);
    }),
    { numRuns: 40 },
  );
  expect(placed).toBeGreaterThan(100);
});
