import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { drawSlatPlan } from "#shared/drawing/slat-plan.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { frameOf, slatsOf } from "#shared/stack/backer.ts";
import { slatSign, walnutFrame } from "../../../support/slat-signs.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

function planOf(document: MockupDocument, numbers: "every" | "fitting"): DisplayList {
  const slats = slatsOf(document, kernel);
  const frame = frameOf(document, kernel);
  const plan = slats?.ok
    ? drawSlatPlan({ layout: slats.value, frame: frame?.ok ? frame.value : null, numbers, widthMm: 76, heightMm: 90 })
    : null;
  if (!plan) throw new Error("the sign has slats");
  return plan;
}
const numbersOf = ({ items }: DisplayList) => items.flatMap((item) => (item.kind === "text" ? [item.text] : []));
const rightmost = ({ items }: DisplayList) =>
  Math.max(
    ...items.flatMap((item) =>
      item.kind === "path" ? item.path.flatMap(({ segments }) => segments.map(({ to }) => to.x)) : [],
    ),
  );

describe("a small picture of slats", () => {
  it("bears the numbers that fit, and leaves out those of slivers", () => {
    const every = numbersOf(planOf(slatSign(), "every"));
    const fitting = numbersOf(planOf(slatSign(), "fitting"));
    expect(every).toHaveLength(27);
    expect(fitting.length).toBeGreaterThan(15);
    expect(fitting.length).toBeLessThan(27);
    expect(every).toEqual(expect.arrayContaining(fitting));
  });

  it("has the frame round it, within its paper, and the body as much smaller", () => {
    const bare = planOf(slatSign(), "fitting");
    const framed = planOf(slatSign({}, { frame: walnutFrame }), "fitting");
    expect(rightmost(bare)).toBeCloseTo(75, 3);
    expect(rightmost(framed)).toBeCloseTo(75, 3);
    // The frame's four pieces are the last that is drawn.
    expect(framed.items.slice(-4).every(({ kind }) => kind === "path")).toBe(true);
    // 636 mm of sign on 74 mm of paper: the body's right edge is 18 mm in.
    expect(rightmost({ ...framed, items: framed.items.slice(0, -4) })).toBeCloseTo(75 - (18 * 74) / 636, 3);
  });
});
