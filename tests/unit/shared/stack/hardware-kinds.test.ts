import { describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { placedStandoffs } from "#shared/drawing/hardware.ts";
import { heldOffsetMm, passesPanel } from "#shared/hardware/standoff-parts.ts";
import type { Hardware } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { buildCapStud, buildLayer, buildSign, hole, plate, standoffHold } from "../../../support/build-sign.ts";

const base = { stockId: null, name: "Standoff", finish: "#C3C1BA", barrelDiameter: 12 };
const { screw } = buildCapStud();
const floor = { floorThickness: 2.5, floorHole: 4, countersunk: true, screw };
const through: Hardware = {
  kind: "throughScrew",
  ...base,
  barrelLength: 12,
  boreDiameter: 4.5,
  washerThickness: 0.5,
  cap: { diameter: 14, thickness: 4 },
  screw,
};
const blind: Hardware = { kind: "blindStud", ...base, barrelLength: 6, studDiameter: 4, studLength: 20 };
const grip: Hardware = {
  kind: "edgeGrip",
  ...base,
  ...floor,
  barrelLength: 12,
  slotWidth: 3.5,
  gripDepth: 5,
  height: 20,
};

/** A pine board of 18 mm, a 3 mm panel of 200 by 100 in its middle on one standoff: heights by hand. */
const cases = [
  {
    hardware: buildCapStud({ capThickness: 3 }),
    offset: 12,
    back: 30,
    face: 33,
    front: { from: 33, to: 36 },
    drilled: true,
  },
  { hardware: through, offset: 12.5, back: 30.5, face: 33.5, front: { from: 33.5, to: 37.5 }, drilled: true },
  {
    hardware: { ...through, cap: null },
    offset: 12.5,
    back: 30.5,
    face: 33.5,
    front: { from: 33.5, to: 33.5 + screw.headHeight },
    drilled: true,
  },
  { hardware: blind, offset: 6, back: 24, face: 27, front: null, drilled: false },
  // The grip stands 20 mm off the wood: 5 mm more than the panel's face.
  { hardware: grip, offset: 12, back: 30, face: 33, front: { from: 33, to: 38 }, drilled: false },
];

describe.each(cases)("on $hardware.kind", ({ hardware, offset, back, face, front, drilled }) => {
  const at = hardware.kind === "edgeGrip" ? hole("h", 399, 200) : hole("h", 300, 200);
  const sign = buildSign([
    buildLayer("B", [plate("b", 200, 100, [300, 200])], { hold: standoffHold([at], hardware, offset) }),
  ]);

  it("the offset is what the hardware holds", () => {
    expect(heldOffsetMm(hardware)).toBe(offset);
    expect(passesPanel(hardware)).toBe(drilled);
  });

  it("the panel's heights and the depth are sums of the parts", async () => {
    const figures = computeFigures(sign, await loadKernel());
    const [piece] = figures.pieces;
    expect(piece?.bottom.nominal).toBeCloseTo(back, 9);
    expect(piece?.top.nominal).toBeCloseTo(face, 9);
    expect(figures.depth.nominal).toBeCloseTo(front?.to ?? face, 9);
    // 3 mm of acrylic at 1190 kg/m³, less the drilled 8 mm disc.
    const drilledMm2 = drilled ? Math.PI * 16 : 0;
    expect(piece?.massG).toBeCloseTo((20_000 - drilledMm2) * 3 * 1190e-6, 1);
  });

  it("its front is drawn where it stands", async () => {
    const [placed] = placedStandoffs(sign, computeFigures(sign, await loadKernel()));
    expect(placed?.barrel).toMatchObject({ from: 18, to: back });
    if (front === null) expect(placed?.front).toBeNull();
    else {
      expect(placed?.front?.from).toBeCloseTo(front.from, 9);
      expect(placed?.front?.to).toBeCloseTo(front.to, 9);
    }
  });
});

it("a glued stud without a spacer takes any offset", () => {
  expect(heldOffsetMm({ ...blind, barrelLength: 0 })).toBeNull();
});
