import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { acknowledgementsOf } from "#shared/mockup/acknowledgements.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { slatSign, walnutFrame } from "../../../support/slat-signs.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

describe("the size that an approver confirms", () => {
  it.each([
    // 600 by 400 and 18 mm on every side.
    { name: "a framed sign", frame: walnutFrame, size: "636 × 436 mm" },
    { name: "a sign without a frame", frame: null, size: "600 × 400 mm" },
  ])("of $name is $size", ({ frame, size }) => {
    const document = slatSign({}, { frame });
    const asked = acknowledgementsOf({ document, figures: computeFigures(document, kernel), words: "", unit: "mm" });
    expect(asked.find(({ id }) => id === "size")?.text).toContain(`The size is ${size} and it stands`);
  });
});

describe("the wood that an approver confirms", () => {
  const plank = { ...slatSign().backer, slats: null };
  it.each([
    { name: "slats", rest: {}, wood: "on slats of Eastern white pine. A screen" },
    {
      name: "framed slats",
      rest: { frame: walnutFrame },
      wood: "on slats of Eastern white pine, framed in Black walnut. A screen",
    },
    { name: "a plain board", rest: { backer: plank }, wood: "on Birch plywood. A screen" },
  ])("of $name is named as it lies", ({ rest, wood }) => {
    const document = slatSign({}, rest);
    const asked = acknowledgementsOf({ document, figures: computeFigures(document, kernel), words: "", unit: "mm" });
    expect(asked.find(({ id }) => id === "colours")?.text).toContain(wood);
  });
});

describe("the finish that an approver confirms", () => {
  const oil = { kind: "other", name: "Hard oil", dryingHours: 12 } as const;
  it.each([
    { name: "bare wood", finish: [], text: "The wood stays bare: no finish is put on it." },
    {
      name: "sanded wood with two coats",
      finish: [{ kind: "sanding", grit: 180 } as const, oil, oil],
      text: "The wood is finished in this order: sanded to 180, Hard oil, 2 coats.",
    },
  ])("of $name is read back coat by coat", ({ finish, text }) => {
    const sign = slatSign();
    const document = { ...sign, backer: { ...sign.backer, finish } };
    const asked = acknowledgementsOf({ document, figures: computeFigures(document, kernel), words: "", unit: "mm" });
    expect(asked.find(({ id }) => id === "finish")?.text).toBe(text);
  });
});
