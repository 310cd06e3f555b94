import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Polygon } from "#shared/geometry/path.ts";
import { layOutSlats } from "#shared/slats/lay-out-slats.ts";
import type { Slat, SlatDesign } from "#shared/slats/slat-layout.ts";
import type { CuttingJob } from "#shared/stock-lengths/cutting-job.ts";
import { partsOfSlats } from "#shared/stock-lengths/parts-of-slats.ts";
import { type CuttingPlan, planCutting } from "#shared/stock-lengths/plan-cutting.ts";
import { faultsOfPlan } from "../../../support/check-cuts.ts";
import { resultOf } from "../../../support/reference-data.ts";
import { usualBoard, usualSlats } from "../../../support/slat-boards.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const kerfMm = 3.2;

function planOf(
  design: Partial<SlatDesign>,
  nests: boolean,
): { slats: readonly Slat[]; job: CuttingJob; plan: CuttingPlan } {
  const { slats } = resultOf(layOutSlats(usualBoard, { ...usualSlats, ...design }, kernel));
  const job: CuttingJob = {
    parts: partsOfSlats(slats),
    stock: [{ id: "bar", label: "bar", lengthMm: 2440, price: null, onHand: null }],
    widthMm: usualSlats.slatWidth,
    saw: { kerfMm, squaringMm: 10, rejectShare: 0, nests },
  };
  const outcome = planCutting(job);
  if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
  return { slats, job, plan: outcome.value };
}

/** A slat as it lies on its bar: turned so that its axis runs along it, its first point at `fromMm`. */
function lying({ untrimmed, axis }: Slat, fromMm: number): Polygon {
  const length = Math.hypot(axis.to.x - axis.from.x, axis.to.y - axis.from.y);
  const [cos, sin] = [(axis.to.x - axis.from.x) / length, (axis.to.y - axis.from.y) / length];
  const turned = untrimmed.map(({ x, y }) => ({
    x: cos * (x - axis.from.x) + sin * (y - axis.from.y),
    y: cos * (y - axis.from.y) - sin * (x - axis.from.x),
  }));
  const first = Math.min(...turned.map(({ x }) => x));
  return turned.map(({ x, y }) => ({ x: x - first + fromMm, y }));
}

const designs: readonly Partial<SlatDesign>[] = [
  {},
  { overhang: 6 },
  { angle: 30 },
  { angle: 60, pattern: "single" },
  { angle: 22.5 },
  { pattern: "mitred", direction: "down", gap: 4 },
];

describe.each([false, true])("the slats of a board, nested: %s", (nests) => {
  it.each(designs)("%o lie on their bars a kerf apart, as they are", (design) => {
    const { slats, job, plan } = planOf(design, nests);
    expect(faultsOfPlan(job, plan)).toEqual([]);
    expect(plan.partCount).toBe(slats.length);
    for (const { places, lengthMm } of plan.bars) {
      const bodies = places.map(({ partId, fromMm }) => {
        const slat = slats.find(({ order }) => String(order) === partId);
        return slat ? lying(slat, fromMm) : [];
      });
      const reach = Math.max(...bodies.flat().map(({ x }) => x));
      expect(reach).toBeLessThanOrEqual(lengthMm + 1e-6);
      expect(Math.min(...bodies.flat().map(({ x }) => x))).toBeGreaterThanOrEqual(10 - 1e-6);
      for (const [index, body] of bodies.entries()) {
        const before = bodies[index - 1];
        if (!before) continue;
        const grown = kernel.offset([before], kerfMm - 0.02, "round");
        expect(regionAreaMm2(kernel.intersect(grown, [body]))).toBeLessThan(0.01);
      }
    }
  });

  // Calculated and proved with another program for a plain kerf of 3.2; the bar counts are the same along the slat.
  it.each([{}, { overhang: 6 }, { angle: 30 }, { angle: 60 }, { angle: 75 }, { angle: 90 }])(
    "%o takes three bars of 2440",
    (design) => {
      expect(planOf(design, nests).plan).toMatchObject({ barCount: 3, leastCost: 3, ended: "proved" });
    },
  );
});

it("nesting saves length", () => {
  const leftOf = (nests: boolean) => Math.max(...planOf({}, nests).plan.bars.map(({ leftMm }) => leftMm));
  expect(leftOf(true)).toBeGreaterThan(leftOf(false) + 200);
});

describe("ends", () => {
  it.each(designs)("%o have their long points where the slats have them", (design) => {
    const { slats, job } = planOf(design, true);
    for (const slat of slats) {
      const part = job.parts.find(({ id }) => id === String(slat.order));
      const body = lying(slat, 0);
      // Reaches along the upper edge (above the axis, y down) and along the lower one.
      const [above, below] = [body.filter(({ y }) => y < 0), body.filter(({ y }) => y > 0)].map((points) =>
        points.map(({ x }) => x),
      );
      const [startUp, startDown] = [Math.min(...(above ?? [])), Math.min(...(below ?? []))];
      const [endUp, endDown] = [Math.max(...(above ?? [])), Math.max(...(below ?? []))];
      if (slat.near.length > 1) expect(part?.start.longPoint).toBe("middle");
      else if (Math.abs(startUp - startDown) > 0.01)
        expect(part?.start.longPoint).toBe(startUp < startDown ? "upper" : "lower");
      if (slat.far.length > 1) expect(part?.end.longPoint).toBe("middle");
      else if (Math.abs(endUp - endDown) > 0.01) expect(part?.end.longPoint).toBe(endUp > endDown ? "upper" : "lower");
    }
    expect(slats.some(({ near, far }) => near.length + far.length > 2)).toBe(true);
  });
});
