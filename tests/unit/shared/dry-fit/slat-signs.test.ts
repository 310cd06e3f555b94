import { expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import type { RuleInput } from "#shared/dry-fit/rule.ts";
import { brads } from "#shared/dry-fit/rules/brads.ts";
import { cladding } from "#shared/dry-fit/rules/cladding.ts";
import { frameEdges } from "#shared/dry-fit/rules/frame-edges.ts";
import { sawSetting } from "#shared/dry-fit/rules/saw-setting.ts";
import { slivers } from "#shared/dry-fit/rules/slivers.ts";
import { runDryFit } from "#shared/dry-fit/run-dry-fit.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { reuseUnchanged } from "#shared/mockup/reuse-unchanged.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { buildCapStud, buildLayer, buildSign, disc, hole, plate, standoffHold } from "../../../support/build-sign.ts";
import { buildFrame, buildSlatSign } from "../../../support/slat-sign.ts";

const { screw } = buildCapStud();

/** A chevron of 38.1 mm with gaps on an ellipse or a rectangle, lettering bonded to it and a panel on standoffs. */
function chevron(kind: "rectangle" | "ellipse"): MockupDocument {
  const hardware = buildCapStud({ screw: { ...screw, length: 19 } });
  const layers = [
    buildLayer("B", [disc("dot", 30, [150, 120]), disc("other", 30, [460, 120])]),
    buildLayer("C", [plate("panel", 240, 90, [300, 300])], {
      hold: standoffHold([hole("h1", 210, 300, { fixed: true }), hole("h2", 390, 300)], hardware),
    }),
  ];
  const board = { ...buildSign([]).board, outline: { kind }, width: 600, height: 470 };
  const frame = kind === "rectangle" ? buildFrame({ depth: 20.7 }) : null;
  const slats = { pattern: "spine" as const, angle: 45, slatWidth: 38.1, spineWidth: 38.1, overhang: 25, gap: 2 };
  return buildSlatSign(slats, layers, { board, frame });
}

const inputOf = (document: MockupDocument, kernel: Kernel): RuleInput => {
  const figures = computeFigures(document, kernel);
  return { document, figures, limits: defaultLimits, context: usualContext, kernel };
};

it.each(["rectangle", "ellipse"] as const)(
  "on %s, what a moved piece does not touch is not worked out anew",
  async (kind) => {
    const plain = await loadKernel();
    let calls = 0;
    const counted = (): Kernel => {
      const count =
        <Given extends unknown[], Got>(make: (...given: Given) => Got) =>
        (...given: Given): Got => {
          calls += 1;
          return make(...given);
        };
      const { union, intersect, difference, offset, strokeOutline } = plain;
      return {
        union: count(union),
        intersect: count(intersect),
        difference: count(difference),
        offset: count(offset),
        strokeOutline: count(strokeOutline),
      };
    };
    const kernel = rememberingKernel(counted());
    const ofBacker = [brads, slivers, sawSetting, frameEdges, cladding];
    const callsOf = (document: MockupDocument): number => {
      kernel.startRun();
      const input = inputOf(document, kernel);
      calls = 0;
      for (const rule of ofBacker) rule.check(input);
      return calls;
    };
    const before = chevron(kind);
    expect(callsOf(before)).toBeGreaterThan(10);
    const next = structuredClone(before);
    const piece = next.layers[0]?.pieces[0];
    if (piece) piece.placement.x += 7;
    const moved = reuseUnchanged(before, next);
    expect(callsOf(moved)).toBe(0);
  },
);

it("what is remembered of slats gives the findings that working all out anew gives", async () => {
  const plain = await loadKernel();
  const kernel = rememberingKernel(plain);
  const edits: ((document: MockupDocument) => void)[] = [
    () => undefined,
    ({ layers }) => {
      const piece = layers[0]?.pieces[0];
      if (piece) piece.placement.y += 40;
    },
    ({ layers }) => {
      const hold = layers[1]?.hold;
      if (hold?.kind === "standoff" && hold.holes[1]) hold.holes[1].x -= 20;
    },
    ({ backer }) => {
      if (backer.slats) backer.slats.start = { kind: "height", height: 11 };
    },
    ({ backer }) => {
      if (backer.slats) Object.assign(backer.slats, { gap: 0, angle: 35 });
    },
    ({ board }) => {
      board.width = 640;
    },
    ({ frame }) => {
      if (frame) frame.depth = 10;
    },
  ];
  for (const kind of ["rectangle", "ellipse"] as const) {
    let document = chevron(kind);
    for (const edit of edits) {
      const next = structuredClone(document);
      edit(next);
      document = reuseUnchanged(document, next);
      kernel.startRun();
      expect(runDryFit(inputOf(document, kernel))).toEqual(runDryFit(inputOf(structuredClone(document), plain)));
    }
  }
});

it("a sound sign of slats in a frame has no stop and no caution of slats, brads, saw or frame", async () => {
  const kernel = await loadKernel();
  const sound = chevron("rectangle");
  const slats = sound.backer.slats;
  if (!slats) throw new Error("It has slats.");
  const laid = {
    ...sound,
    backer: { ...sound.backer, slats: { ...slats, gap: 0, start: { kind: "height" as const, height: 40.6 } } },
  };
  const findings = runDryFit(inputOf(laid, kernel));
  const told = findings.filter(
    ({ rule, severity }) => severity !== "remark" && (rule <= 14 || (rule >= 31 && rule <= 35)),
  );
  expect(told.map(({ rule, text }) => `${rule} ${text}`)).toEqual([]);
  expect(findings.map(({ rule }) => rule)).toContain(35);
});
