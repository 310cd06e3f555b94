import fc from "fast-check";
import { expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { explodedOrder, orderWords } from "#shared/stack/exploded-order.ts";
import { buildLayer, buildSign, plate } from "../../../support/build-sign.ts";
import { orreryBooks } from "../../../support/orrery-books.ts";

it("a sign goes together from the wall outward, what stands on the same thing in one step", async () => {
  // The disc and the lettering stand on the board, rings and sun on the disc; planets lie in gaps cut into the rings.
  const steps = explodedOrder(computeFigures(orreryBooks(), await loadKernel()));
  expect(steps).toEqual([["A"], ["B", "G"], ["C", "D", "E", "F"]]);
  expect(orderWords(steps)).toBe("A, then B and G, then C, D, E and F");
});

it("a bare board is one step, and a layer without pieces goes on after it", async () => {
  const kernel = await loadKernel();
  expect(explodedOrder(computeFigures(buildSign([]), kernel))).toEqual([["A"]]);
  expect(explodedOrder(computeFigures(buildSign([buildLayer("B", [])]), kernel))).toEqual([["A"], ["B"]]);
});

it("nothing comes before what it stands on, and every layer comes once", async () => {
  const kernel = await loadKernel();
  const shape = fc.record({ x: fc.integer({ min: 50, max: 550 }), y: fc.integer({ min: 50, max: 350 }) });
  fc.assert(
    fc.property(fc.array(fc.array(shape, { maxLength: 3 }), { maxLength: 6 }), (drawn) => {
      const sign = buildSign(
        drawn.map((places, level) =>
          buildLayer(
            String.fromCharCode(66 + level),
            places.map(({ x, y }, index) => plate(`p${level}-${index}`, 120, 90, [x, y])),
          ),
        ),
      );
      const figures = computeFigures(sign, kernel);
      const steps = explodedOrder(figures);
      expect(steps.flat().toSorted()).toEqual(["A", ...sign.layers.map(({ key }) => key)]);
      const stepOf = (key: string) => steps.findIndex((keys) => keys.includes(key));
      for (const { layerKey, restsOn } of figures.pieces)
        for (const below of restsOn) expect(stepOf(below)).toBeLessThan(stepOf(layerKey));
    }),
    { numRuns: 60 },
  );
});
