import { describe, expect, it } from "vitest";
import { boxOfPath } from "#shared/geometry/box.ts";
import { circlePath } from "#shared/geometry/shapes.ts";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { dryingHours } from "#shared/mockup/drying-hours.ts";
import { type BoardDraft, draftOfBoard, fieldsOfDraft } from "@/features/mockup/model/board-draft.ts";
import { boardProblems, hasProblems } from "@/features/mockup/model/board-problems.ts";
import { coatOf, coatProblems, draftOfCoat, moveCoat, newCoat } from "@/features/mockup/model/coat-draft.ts";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import { setBoard } from "@/features/mockup/model/commands/set-board.ts";
import { spreadFixings } from "@/features/mockup/model/fixings.ts";
import { outlineChoices } from "@/features/mockup/model/outline-of-piece.ts";
import { barrel, emptyMockup, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

/** A 275 mm disc on standoffs in the middle of a 600 × 400 board with two fixings and a stain. */
function sign(fields: Partial<MockupDocument> = {}): MockupDocument {
  const base = emptyMockup();
  return addPlate(
    {
      ...base,
      hanging: {
        ...base.hanging,
        carriesKg: 9.0718474,
        points: [
          { x: 150, y: 30 },
          { x: 450, y: 30 },
        ],
      },
      backer: {
        ...base.backer,
        grainTurn: 30,
        finish: [{ kind: "stain", name: "Umber", colour: "#4A2B12", strength: 1 / 3, dryingHours: 8 }],
      },
      ...fields,
    },
    {
      shape: { kind: "circle", diameter: 275 },
      site: inside,
      id: "disc",
      name: "Night disc",
      stock: midnight,
      thickness: 4.5,
      hold: { kind: "standoff", hardware: barrel(19) },
    },
  );
}

/** What the form would do with these fields of its draft. */
function taken(document: MockupDocument, more: Partial<BoardDraft>, unit: "mm" | "in" = "mm"): MockupDocument {
  const draft = { ...draftOfBoard(document, unit), ...more };
  return setBoard(document, fieldsOfDraft(draft, document, unit));
}
const problemsOf = (document: MockupDocument, more: Partial<BoardDraft>) =>
  boardProblems({ ...draftOfBoard(document, "mm"), ...more }, document, "mm");

describe("a board that is written in a form", () => {
  it("stays the same document when nothing was changed, in either unit", () => {
    const document = sign();
    expect(taken(document, {})).toBe(document);
    expect(taken(document, {}, "in")).toBe(document);
  });

  it("keeps to the last digit what was left alone: the load, an aslant grain, an outline of its own", () => {
    const path = circlePath({ x: 300, y: 200 }, 200).map(({ start, segments }) => ({ start, segments: [...segments] }));
    const before = sign({ board: { ...emptyMockup().board, outline: { kind: "path", path } } });
    const after = taken(before, { thickness: 25 }, "in");
    expect(after.backer).toEqual({ ...before.backer, thickness: 25 });
    expect(after.hanging).toBe(before.hanging);
    expect(after.board).toBe(before.board);
  });

  it("states the load in pounds for a shop that works in inches", () => {
    expect(draftOfBoard(sign(), "in").carries).toBe(20);
    // 25 lb of 453.59237 g.
    expect(taken(sign(), { carries: 25 }, "in").hanging.carriesKg).toBe(11.34);
    expect(taken(sign(), { carries: null }, "in").hanging.carriesKg).toBeNull();
  });

  it("takes outline, grain, pose and finish, and is a document", () => {
    const coats = [newCoat("sanding", "a"), newCoat("stain", "b"), newCoat("clear coat", "c")];
    const after = taken(sign(), { outline: "rounded", radius: 25, grainTurn: 90, pose: "tilted", finish: coats });
    expect(after.board.outline).toEqual({ kind: "rounded", radius: 25 });
    expect(after.backer.grainTurn).toBe(90);
    expect(after.hanging.pose).toBe("tilted");
    expect(after.backer.finish.map(({ kind }) => kind)).toEqual(["sanding", "stain", "clear coat"]);
    expect(dryingHours(after.backer.finish)).toBe(10);
    expect(documentSchema.safeParse(after).success).toBe(true);
  });

  it("moves the fixings with what lies on the board when it grows about its middle", () => {
    const after = taken(sign(), { width: 700, height: 380 });
    expect(after.layers[0]?.pieces[0]?.placement).toMatchObject({ x: 350, y: 190 });
    expect(after.hanging.points).toEqual([
      { x: 200, y: 20 },
      { x: 500, y: 20 },
    ]);
  });

  it("puts a written fixing where the form showed it, the board's new size included", () => {
    const [first, second] = draftOfBoard(sign(), "mm").fixings;
    if (!first || !second) throw new Error("the sign has two fixings");
    const after = taken(sign(), { width: 700, fixings: [{ ...first, fromX: -330 }, second] });
    expect(after.hanging.points).toEqual([
      { x: 20, y: 30 },
      { x: 500, y: 30 },
    ]);
  });
});

describe("the outline of a piece", () => {
  it("becomes the board's where the piece lies, and everything else keeps its place from it", () => {
    const before = sign();
    const after = taken(before, { outline: "piece", pieceId: "disc", width: 275, height: 275 });
    expect(after.board).toMatchObject({ width: 275, height: 275, outline: { kind: "path" } });
    const outline = after.board.outline.kind === "path" ? after.board.outline.path : [];
    expect(boxOfPath(outline)).toEqual({ x: 0, y: 0, width: 275, height: 275 });
    expect(after.layers[0]?.pieces[0]?.placement).toMatchObject({ x: 137.5, y: 137.5 });
    // 150 − (300 − 137.5) across, 30 − (200 − 137.5) down.
    expect(after.hanging.points[0]).toEqual({ x: -12.5, y: -32.5 });
    expect(documentSchema.safeParse(after).success).toBe(true);
  });

  it("takes the piece off when it was the board itself, and grows about it with a margin", () => {
    const after = taken(sign(), { outline: "piece", pieceId: "disc", width: 300, height: 300, removePiece: true });
    expect(after.layers[0]?.pieces).toEqual([]);
    expect(after.board).toMatchObject({ width: 300, height: 300 });
  });

  it("is asked for by name, and offered largest first", () => {
    expect(problemsOf(sign(), { outline: "piece" }).fields).toEqual({ pieceId: "Choose the piece." });
    expect(outlineChoices(sign())).toEqual([{ pieceId: "disc", name: "B, Night disc", width: 275, height: 275 }]);
  });
});

describe("what stands in the way", () => {
  it.each<{ more: Partial<BoardDraft>; field: string }>([
    { more: { width: 19.9 }, field: "width" },
    { more: { height: null }, field: "height" },
    { more: { height: Number.NaN }, field: "height" },
    { more: { outline: "rounded", radius: 0 }, field: "radius" },
    { more: { gap: -1 }, field: "gap" },
    { more: { quantity: 1.5 }, field: "quantity" },
    { more: { carries: 0 }, field: "carries" },
    { more: { viewingDistance: 50 }, field: "viewingDistance" },
  ])("$more is said at $field", ({ more, field }) => {
    expect(Object.keys(problemsOf(sign(), more).fields)).toEqual([field]);
  });

  it("a side of 20 mm is enough", () => {
    const narrow = { width: 20, fixings: [] };
    expect(hasProblems(problemsOf(sign(), narrow))).toBe(false);
  });

  it("a fixing beside the board is said at that fixing, by the outline and not by its box", () => {
    const corner = [{ id: "one", fromX: -290, fromY: -190 }];
    expect(hasProblems(problemsOf(sign(), { fixings: corner }))).toBe(false);
    expect([...problemsOf(sign(), { outline: "ellipse", fixings: corner }).fixings.keys()]).toEqual(["one"]);
  });
});

describe("coats", () => {
  it("come back as they were", () => {
    for (const coat of sign().backer.finish) expect(coatOf(draftOfCoat(coat, "x"))).toEqual(coat);
  });

  it.each([
    { coat: { ...newCoat("sanding", "a"), grit: 23 }, fields: ["grit"] },
    { coat: { ...newCoat("sanding", "a"), grit: 180.5 }, fields: ["grit"] },
    { coat: { ...newCoat("stain", "a"), strength: 1.01, name: " " }, fields: ["name", "strength"] },
    { coat: { ...newCoat("clear coat", "a"), dryingHours: null }, fields: ["dryingHours"] },
    { coat: newCoat("other", "a"), fields: ["name"] },
    { coat: { ...newCoat("other", "a"), name: "Wax", dryingHours: 720 }, fields: [] },
  ])("$coat.kind asks for $fields", ({ coat, fields }) => {
    expect(Object.keys(coatProblems(coat))).toEqual(fields);
    expect(coatOf(coat) === null).toBe(fields.length > 0);
  });

  it("change places with a neighbour, and stay at either end", () => {
    const coats = [newCoat("sanding", "a"), newCoat("stain", "b"), newCoat("other", "c")];
    const order = (list: readonly { id: string }[]) => list.map(({ id }) => id).join("");
    expect(order(moveCoat(coats, "b", 1))).toBe("acb");
    expect(order(moveCoat(coats, "b", -1))).toBe("bac");
    expect(moveCoat(coats, "a", -1)).toBe(coats);
    expect(moveCoat(coats, "c", 1)).toBe(coats);
  });
});

describe("fixings spread along the upper edge", () => {
  const board = (outline: MockupDocument["board"]["outline"]) => ({ ...emptyMockup().board, outline });

  it("share the width evenly, each as far below the edge", () => {
    expect(spreadFixings(board({ kind: "rectangle" }), { count: 2, below: 30 })).toEqual([
      { x: 150, y: 30 },
      { x: 450, y: 30 },
    ]);
  });

  it("follow the edge of an ellipse", () => {
    const [left, middle, right] = spreadFixings(board({ kind: "ellipse" }), { count: 3, below: 0 });
    expect(middle?.y).toBeCloseTo(0, 1);
    // At a sixth of the width: 200·(1 − √(1 − (2/3)²)).
    expect(left?.y).toBeCloseTo(200 * (1 - Math.sqrt(1 - 4 / 9)), 1);
    expect(right?.y).toBeCloseTo(left?.y ?? 0, 2);
  });
});
