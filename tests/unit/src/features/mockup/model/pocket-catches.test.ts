import { describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { thicknessUnder } from "@/features/mockup/model/cut-into.ts";
import { documentOfDrag, labelOfDrag } from "@/features/mockup/model/drag.ts";
import { catchDepth, nextDepth, pocketCatches } from "@/features/mockup/model/pocket-catches.ts";
import { bondHold, buildLayer, buildSign, plate, pocketHold } from "../../../../../support/build-sign.ts";

describe("depths that a layer let in catches on", () => {
  it.each([
    {
      what: "3 mm into 18 mm: half in, flush, and the deepest that leaves a third",
      from: { thickness: 3, cutInto: 18, floorShare: 1 / 3 },
      depths: [
        [1.5, "half in"],
        [3, "flush"],
        [12, "deepest"],
      ],
    },
    {
      what: "6 mm into 6 mm: flush would leave no floor",
      from: { thickness: 6, cutInto: 6, floorShare: 1 / 3 },
      depths: [
        [3, "half in"],
        [4, "deepest"],
      ],
    },
    {
      what: "4 mm into 3 mm: half in is the deepest, and is said once",
      from: { thickness: 4, cutInto: 3, floorShare: 1 / 3 },
      depths: [[2, "half in"]],
    },
    {
      what: "into something unknown there is no deepest",
      from: { thickness: 4, cutInto: null, floorShare: 1 / 3 },
      depths: [
        [2, "half in"],
        [4, "flush"],
      ],
    },
  ])("$what", ({ from, depths }) => {
    expect(pocketCatches(from).map(({ depth, what }) => [depth, what])).toEqual(depths);
  });

  const catches = pocketCatches({ thickness: 3, cutInto: 18, floorShare: 1 / 3 });

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

describe("what a pocket is cut into", () => {
  it("is the backer, or the layer that it lies on", async () => {
    const kernel = await loadKernel();
    const document = buildSign([
      buildLayer("B", [plate("b", 100, 100, [200, 200])], { thickness: 5, hold: bondHold }),
      buildLayer("C", [plate("c", 20, 20, [200, 200])], { thickness: 3, hold: pocketHold(1) }),
      buildLayer("D", [plate("d", 20, 20, [60, 60])], { thickness: 3, hold: pocketHold(1) }),
    ]);
    const figures = computeFigures(document, kernel);
    expect(thicknessUnder(document, figures, "C")).toBe(5);
    expect(thicknessUnder(document, figures, "D")).toBe(document.backer.thickness);
    expect(thicknessUnder(document, figures, "Z")).toBeNull();
  });
});

it("a layer dragged deeper in the section has that pocket when the hand lets go", () => {
  const document = buildSign([buildLayer("B", [plate("b", 50, 50, [100, 100])], { hold: pocketHold(1) })]);
  const drag = { kind: "let in", key: "B", depth: 2.5 } as const;
  expect(documentOfDrag(document, drag).layers[0]?.hold).toMatchObject({ kind: "pocket", depth: 2.5 });
  expect(labelOfDrag(drag)).toBe("Let B in");
});
