import { describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { deepestPocketOf } from "#shared/dry-fit/pocket-depth.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { documentOfDrag, labelOfDrag } from "@/features/mockup/model/drag.ts";
import { catchDepth, nextDepth, pocketCatches } from "@/features/mockup/model/pocket-catches.ts";
import { bondHold, buildLayer, buildSign, plate, pocketHold } from "../../../../../support/build-sign.ts";

describe("depths that a layer let in catches on", () => {
  it.each([
    {
      what: "3 mm where 12 mm are the deepest: half in, flush, deepest",
      from: { thickness: 3, deepest: 12 },
      depths: [
        [1.5, "half in"],
        [3, "flush"],
        [12, "deepest"],
      ],
    },
    {
      what: "6 mm where half in would leave no floor",
      from: { thickness: 6, deepest: 2.8 },
      depths: [[2.8, "deepest"]],
    },
    {
      what: "4 mm where half in is the deepest, which is said once",
      from: { thickness: 4, deepest: 2 },
      depths: [[2, "half in"]],
    },
    {
      what: "into something unknown there is no deepest",
      from: { thickness: 4, deepest: null },
      depths: [
        [2, "half in"],
        [4, "flush"],
      ],
    },
  ])("$what", ({ from, depths }) => {
    expect(pocketCatches(from).map(({ depth, what }) => [depth, what])).toEqual(depths);
  });

  const catches = pocketCatches({ thickness: 3, deepest: 12 });

  it("takes the nearest within reach, and a tenth of a millimetre outside it", () => {
    expect(catchDepth(2.8, catches, 0.3)).toBe(3);
    expect(catchDepth(2.26, catches, 0.3)).toBe(2.3);
    expect(catchDepth(2.3, catches, 2)).toBe(3);
    expect(catchDepth(2.26, [], 5)).toBe(2.3);
  });

  it("steps from one to the next and stays at the ends", () => {
    expect(nextDepth(1.5, catches, "deeper")).toBe(3);
    expect(nextDepth(2, catches, "shallower")).toBe(1.5);
    expect(nextDepth(12, catches, "deeper")).toBeUndefined();
    expect(nextDepth(1.5, catches, "shallower")).toBeUndefined();
  });
});

/**
 * By hand: 5 mm cast may be 0.9 mm thinner (ISO 7823-1), is cut 0.2 mm too deep and keeps a third, so 4.1 − 0.2 − 1.67; the
 * 18 mm board is as thick as it is, so 18 − 0.2 − 6.
 */
it("the deepest pocket is told by what it is cut into", async () => {
  const kernel = await loadKernel();
  const document = buildSign([
    buildLayer("B", [plate("b", 100, 100, [200, 200])], { thickness: 5, hold: bondHold }),
    buildLayer("C", [plate("c", 20, 20, [200, 200])], { thickness: 3, hold: pocketHold(1) }),
    buildLayer("D", [plate("d", 20, 20, [60, 60])], { thickness: 3, hold: pocketHold(1) }),
  ]);
  const input = { document, figures: computeFigures(document, kernel), limits: defaultLimits };
  expect([document.backer.thickness, document.layers[0]?.stock.process]).toEqual([18, "cast"]);
  expect(deepestPocketOf(input, "C")).toBe(2.2);
  expect(deepestPocketOf(input, "D")).toBe(11.8);
  expect(deepestPocketOf(input, "Z")).toBeNull();
});

it("a layer dragged deeper in the section has that pocket when the hand lets go", () => {
  const document = buildSign([buildLayer("B", [plate("b", 50, 50, [100, 100])], { hold: pocketHold(1) })]);
  const drag = { kind: "let in", key: "B", depth: 2.5 } as const;
  expect(documentOfDrag(document, drag).layers[0]?.hold).toMatchObject({ kind: "pocket", depth: 2.5 });
  expect(labelOfDrag(drag)).toBe("Let B in");
});
