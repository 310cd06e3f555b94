import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { frameOf, slatsOf } from "#shared/stack/backer.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { layBoard } from "@/features/mockup/engine/lay-board.ts";
import type { SlatsDraft } from "@/features/mockup/model/backer-draft.ts";
import { type BoardDraft, draftOfBoard, fieldsOfDraft, measuresOf } from "@/features/mockup/model/board-draft.ts";
import { boardProblems, hasProblems } from "@/features/mockup/model/board-problems.ts";
import { setBoard } from "@/features/mockup/model/commands/set-board.ts";
import { slatSign, walnut, walnutFrame } from "../../../../../support/slat-signs.ts";
import { emptyMockup, pine } from "../sample-mockup.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const woods = [{ wood: pine, thicknessesMm: [12, 18, 20] }];
const start = (document: MockupDocument, unit: LengthUnit = "mm") => draftOfBoard(document, unit, woods);
const taken = (document: MockupDocument, more: Partial<BoardDraft>, unit: LengthUnit = "mm") =>
  setBoard(document, fieldsOfDraft({ ...start(document, unit), ...more }, document, unit));
const withSlats = (document: MockupDocument, more: Partial<SlatsDraft> = {}): Partial<BoardDraft> => ({
  backerIs: "slats",
  slats: { ...start(document).slats, ...more },
});
const framed = (document: MockupDocument, more: Partial<BoardDraft["frame"]> = {}): Partial<BoardDraft> => ({
  isFramed: true,
  frame: { ...start(document).frame, depth: 20, ...more },
});
const problemsOf = (document: MockupDocument, more: Partial<BoardDraft>) =>
  boardProblems({ ...start(document), ...more }, document, "mm");

describe("a backer of slats", () => {
  it("begins with slats of the plank's wood at 45° on 12 mm of it, which can be laid", () => {
    const plank = emptyMockup();
    const after = taken(plank, withSlats(plank));
    expect(after.backer).toMatchObject({ stock: pine, thickness: 12 });
    expect(after.backer.slats).toEqual({
      stock: pine,
      thickness: 9,
      pattern: "spine",
      angle: 45,
      slatWidth: 38,
      gap: 0,
      spineWidth: 38,
      spineOffset: 0,
      start: { kind: "corner" },
      direction: "up",
      overhang: 25,
    });
    expect(slatsOf(after, kernel)?.ok).toBe(true);
    expect(documentSchema.safeParse(after).success).toBe(true);
  });

  it("takes the stocked thickness that is nearest to 12 mm for the substrate", () => {
    const stocked = [{ wood: pine, thicknessesMm: [18, 25] }];
    expect(draftOfBoard(emptyMockup(), "mm", stocked).substrate.thickness).toBe(18);
  });

  it.each<LengthUnit>(["mm", "in"])("with its frame stays the same document when nothing is written, in %s", (unit) => {
    for (const measures of ["body", "overall"] as const) {
      const sign = slatSign({ start: { kind: "height", height: 33.3 } }, { frame: walnutFrame });
      const document = { ...sign, board: { ...sign.board, measures } };
      expect(taken(document, {}, unit)).toBe(document);
    }
  });

  it("becomes a plank again, and leaves the plank that was there when it is only looked at", () => {
    const sign = slatSign();
    const plank = taken(sign, { backerIs: "plank" });
    expect(plank.backer).toEqual({ ...sign.backer, slats: null });
    const bare = emptyMockup();
    expect(taken(bare, { ...withSlats(bare, { angle: 60 }), backerIs: "plank" })).toBe(bare);
  });

  it("keeps a start that was written at a height, and the corner's where it was not", () => {
    const bare = emptyMockup();
    const begun = taken(bare, withSlats(bare, { startsAt: "height", startHeight: -12.34567 }));
    expect(begun.backer.slats?.start).toEqual({ kind: "height", height: -12.346 });
    expect(taken(begun, withSlats(begun, { startsAt: "corner" })).backer.slats?.start).toEqual({ kind: "corner" });
  });
});

describe("a framed board's measures", () => {
  it("written overall are the body and the frame on either side of it", () => {
    const bare = emptyMockup();
    const after = taken(bare, { ...framed(bare, { width: 18 }), measures: "overall", width: 636, height: 436 });
    expect(after.board).toMatchObject({ width: 600, height: 400, measures: "overall" });
    expect(after.frame).toEqual({ stock: pine, width: 18, depth: 20, mitred: true });
    expect(start(after)).toMatchObject({ width: 636, height: 436 });
  });

  it("written of the body are the body's", () => {
    const bare = emptyMockup();
    const after = taken(bare, { ...framed(bare), measures: "body", width: 500 });
    expect(after.board).toMatchObject({ width: 500, height: 400, measures: "body" });
  });

  it("are the body's where the outline is no rectangle, whatever they were to mean", () => {
    const bare = emptyMockup();
    const draft = { ...start(bare), ...framed(bare), measures: "overall", outline: "rounded" } as const;
    expect(measuresOf(draft, bare)).toEqual({ width: 600, height: 400 });
  });

  it("leave a body of 20 mm at the least inside the frame", () => {
    const bare = emptyMockup();
    const narrow = (width: number) => problemsOf(bare, { ...framed(bare), measures: "overall", width }).fields;
    expect(narrow(55.9)).toEqual({ width: "From 56 mm to 10000 mm." });
    expect(narrow(56)).toEqual({});
  });

  it("move what lies on the board with its middle", () => {
    const bare = emptyMockup({ hanging: { ...emptyMockup().hanging, points: [{ x: 300, y: 30 }] } });
    const after = taken(bare, { ...framed(bare), measures: "overall" });
    // The body loses 18 mm on every side, and the fixing keeps its way from the middle.
    expect(after.hanging.points).toEqual([{ x: 282, y: 12 }]);
  });
});

describe("what stands in the way of slats", () => {
  it.each<{ more: Partial<SlatsDraft>; field: keyof SlatsDraft; words: string }>([
    { more: { angle: 14.9 }, field: "angle", words: "From 15 to 90 degrees." },
    { more: { angle: null }, field: "angle", words: "From 15 to 90 degrees." },
    { more: { thickness: Number.NaN }, field: "thickness", words: "Write a length." },
    { more: { slatWidth: 401 }, field: "slatWidth", words: "wider than the board: choose 400 mm at most" },
    { more: { slatWidth: 0.5 }, field: "slatWidth", words: "From 1 mm to 10000 mm." },
    { more: { gap: 39 }, field: "gap", words: "wider than the slats of 38 mm" },
    { more: { spineWidth: 599 }, field: "spineWidth", words: "The spine's width must lie between" },
    { more: { spineOffset: 290 }, field: "spineOffset", words: "The spine's distance from the middle" },
    { more: { startsAt: "height", startHeight: null }, field: "startHeight", words: "From −10000 mm to 10000 mm." },
    { more: { overhang: 1001 }, field: "overhang", words: "From 0 mm to 1000 mm." },
  ])("$more is said at $field", ({ more, field, words }) => {
    const bare = emptyMockup();
    const { slats } = problemsOf(bare, withSlats(bare, more));
    expect(Object.keys(slats)).toEqual([field]);
    expect(Object.values(slats)[0]).toContain(words);
  });

  it.each<Partial<SlatsDraft>>([
    { pattern: "single", spineWidth: null, spineOffset: Number.NaN },
    { pattern: "mitred", spineWidth: null },
    { startsAt: "corner", startHeight: null },
    { angle: 90 },
  ])("is nothing that the pattern has no use for: %o", (more) => {
    const bare = emptyMockup();
    expect(hasProblems(problemsOf(bare, withSlats(bare, more)))).toBe(false);
    expect(taken(bare, withSlats(bare, more)).backer.slats?.angle).toBe(more.angle ?? 45);
  });

  it("is not asked of slats while the backer is a plank", () => {
    const bare = emptyMockup();
    expect(hasProblems(problemsOf(bare, { ...withSlats(bare, { slatWidth: 900 }), backerIs: "plank" }))).toBe(false);
  });
});

describe("what stands in the way of a frame", () => {
  it("round edges are said at the frame, and its measures at their fields", () => {
    const bare = emptyMockup();
    expect(problemsOf(bare, { ...framed(bare), outline: "ellipse" }).frame.isFramed).toContain("round edges");
    expect(Object.keys(problemsOf(bare, framed(bare, { depth: 501, width: 0 })).frame)).toEqual(["width", "depth"]);
    expect(problemsOf(bare, framed(bare, { stock: walnut })).frame).toEqual({});
  });

  it("what only the layout tells is said at its field too", () => {
    const triangle = {
      kind: "path" as const,
      path: [
        {
          start: { x: 0, y: 0 },
          segments: [
            { kind: "line" as const, to: { x: 600, y: 0 } },
            { kind: "line" as const, to: { x: 300, y: 400 } },
            { kind: "line" as const, to: { x: 0, y: 0 } },
          ],
        },
      ],
    };
    const document = emptyMockup({ board: { ...emptyMockup().board, outline: triangle } });
    const draft = { ...start(document), ...framed(document, { mitred: false }) };
    const { refusals } = layBoard(taken(document, draft), kernel);
    const { frame } = boardProblems(draft, document, "mm", refusals);
    expect(frame).toEqual({ mitred: "Butted corners need a rectangular board. Choose mitred ones." });
  });
});

describe("slats as they are laid beside the page", () => {
  it("come with their picture, their number and the best start", () => {
    const laid = layBoard(slatSign({}, { frame: walnutFrame }), kernel);
    expect(laid.refusals).toEqual({ slats: null, frame: null });
    // (281 + 400) mm of each side along the spine, a slat every 38 · √2: 12.7, thirteen slats.
    expect(laid.count).toBe(26);
    expect(laid.plan?.items.length).toBeGreaterThan(26);
    expect(laid.start?.best.slivers).toBe(0);
  });

  it("come with the reason when they can't be laid", () => {
    const laid = layBoard(slatSign({ slatWidth: 500 }), kernel);
    expect(laid.refusals.slats?.field).toBe("slatWidth");
    expect(laid.plan).toBeNull();
  });
});

/** Mostly what somebody means, sometimes whatever a keyboard gives. */
const typed = (least: number, most: number) =>
  fc.oneof(
    { weight: 30, arbitrary: fc.double({ min: least, max: most, noNaN: true }) },
    { weight: 1, arbitrary: fc.constant(null) },
    { weight: 1, arbitrary: fc.constant(Number.NaN) },
    { weight: 1, arbitrary: fc.double({ noNaN: true }) },
  );
const writing = fc.record({
  backerIs: fc.constantFrom("plank" as const, "slats" as const),
  outline: fc.constantFrom("rectangle" as const, "rectangle" as const, "rounded" as const, "ellipse" as const),
  measures: fc.constantFrom("body" as const, "overall" as const),
  isFramed: fc.boolean(),
  width: typed(10, 700),
  height: typed(10, 700),
  slats: fc.record({
    stock: fc.constant(walnut),
    thickness: typed(0.5, 20),
    pattern: fc.constantFrom("spine" as const, "mitred" as const, "single" as const),
    angle: typed(14, 91),
    slatWidth: typed(8, 60),
    gap: typed(-1, 12),
    spineWidth: typed(0, 60),
    spineOffset: typed(-100, 100),
    startsAt: fc.constantFrom("corner" as const, "height" as const),
    startHeight: typed(-100, 100),
    direction: fc.constantFrom("up" as const, "down" as const),
    overhang: typed(-1, 50),
  }),
  frame: fc.record({ stock: fc.constant(walnut), width: typed(0, 60), depth: typed(0, 60), mitred: fc.boolean() }),
});

describe("whatever is written", () => {
  it("the document stays valid, and slats and frame without a problem can be made", () => {
    let made = 0;
    fc.assert(
      fc.property(writing, fc.boolean(), (more, isPlank) => {
        const before = isPlank ? emptyMockup() : slatSign({}, { frame: walnutFrame });
        const after = taken(before, more);
        expect(documentSchema.safeParse(after).error?.issues ?? []).toEqual([]);
        const { slats, frame, fields } = problemsOf(before, more);
        if (Object.keys({ ...slats, ...frame, ...fields }).length > 0) return;
        expect(slatsOf(after, kernel)?.ok ?? true).toBe(true);
        expect(frameOf(after, kernel)?.ok ?? true).toBe(true);
        made += 1;
      }),
      { numRuns: 200, seed: 4 },
    );
    expect(made).toBeGreaterThan(10);
  });
});
