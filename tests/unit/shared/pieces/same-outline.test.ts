import fc from "fast-check";
import { beforeAll, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";
import { isWithin } from "#shared/pieces/same-outline.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

/** A wavy outline of 40 corners about the origin. */
const wavy = fc.array(fc.double({ min: 0.9, max: 1.1, noNaN: true }), { minLength: 40, maxLength: 40 }).map(
  (radii): Region => [
    radii.map((radius, k) => ({
      x: 30 * radius * Math.cos((2 * Math.PI * k) / radii.length),
      y: 30 * radius * Math.sin((2 * Math.PI * k) / radii.length),
    })),
  ],
);

it("corners that are looked at first never change the answer", () => {
  fc.assert(
    fc.property(wavy, wavy, fc.double({ min: 0.1, max: 8, noNaN: true }), (a, b, within) => {
      const [one, other] = [kernel.union(a, "evenodd"), kernel.union(b, "evenodd")];
      const over = (p: Region, q: Region) => kernel.difference(p, kernel.offset(q, within, "round")).length > 0;
      expect(isWithin(one, other, within, kernel)).toBe(!over(one, other) && !over(other, one));
    }),
  );
});

it("an outline is within nothing of itself, and not of one that lies far off", () => {
  fc.assert(
    fc.property(wavy, (a) => {
      const one = kernel.union(a, "evenodd");
      expect(isWithin(one, one, 0.1, kernel)).toBe(true);
      const far = one.map((ring) => ring.map(({ x, y }) => ({ x: x + 5, y })));
      expect(isWithin(one, far, 1, kernel)).toBe(false);
    }),
  );
});
