import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { type Coat, documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import { bringInArtwork } from "@/features/mockup/model/commands/bring-in-artwork.ts";
import { addHole, fixHole, proposeHoles, removeHole, setHole } from "@/features/mockup/model/commands/holes.ts";
import { moveLayer, removeLayer } from "@/features/mockup/model/commands/order-layers.ts";
import {
  centrePieces,
  movePieces,
  placePiece,
  removePieces,
  scalePieces,
  turnPieces,
} from "@/features/mockup/model/commands/pieces.ts";
import { setBoard } from "@/features/mockup/model/commands/set-board.ts";
import { bondLayer, raiseLayer, standLayer } from "@/features/mockup/model/commands/set-hold.ts";
import { setLayer } from "@/features/mockup/model/commands/set-layer.ts";
import {
  commit,
  goToStep,
  mostSteps,
  redo,
  startHistory,
  stepsInWords,
  undo,
} from "@/features/mockup/model/history.ts";
import { barrel, brass, cement, chalk, emptyMockup, midnight, pine } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

type Edit = (document: MockupDocument, id: string) => MockupDocument;

/** Any number a field could be given, the impossible ones too. */
const oil: Coat = { kind: "clear coat", name: "Oil", base: "oil or shellac", dryingHours: 12 };
const number = fc.oneof(fc.double({ min: -12_000, max: 12_000 }), fc.integer({ min: -50, max: 900 }), fc.double());
const key = fc.constantFrom("B", "C", "D", "E", "F", "Z");
const stock = fc.constantFrom(midnight, brass, chalk);
const hardware = fc.constantFrom(barrel(12), barrel(19), barrel(25));
const pieceIds = (document: MockupDocument, pick: number) =>
  document.layers.flatMap(({ pieces }) => pieces.map(({ id }) => id)).filter((_, index) => (index + pick) % 3 !== 0);
const holeId = (document: MockupDocument, pick: number) =>
  document.layers.flatMap(({ hold }) => (hold.kind === "standoff" ? hold.holes.map(({ id }) => id) : []))[pick] ??
  "none";

const edit: fc.Arbitrary<Edit> = fc.oneof(
  fc
    .record({
      width: number,
      height: number,
      stock,
      hardware,
      bonded: fc.boolean(),
      round: fc.boolean(),
      name: fc.string(),
    })
    .map(
      ({ width, height, stock: sheet, hardware: stud, bonded, round, name }): Edit =>
        (document, id) =>
          addPlate(document, {
            shape: round ? { kind: "circle", diameter: width } : { kind: "rectangle", width, height },
            site: inside,
            id,
            name,
            stock: sheet,
            thickness: 3,
            hold: bonded ? { kind: "bond", adhesive: cement } : { kind: "standoff", hardware: stud },
          }),
    ),
  fc.record({ stock, solid: fc.boolean() }).map(
    ({ stock: sheet, solid }): Edit =>
      (document, id) =>
        bringInArtwork(document, {
          artwork: {
            artworkId: "0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11",
            widthMm: 90,
            heightMm: 50,
            pieces: [
              {
                index: 0,
                colour: "#111111",
                path: rectanglePath({ x: 0, y: 0, width: 50, height: 50 }),
                box: { x: 0, y: 0, width: 50, height: 50 },
                areaMm2: 2500,
              },
              {
                index: 1,
                colour: "#EEEEEE",
                path: rectanglePath({ x: 60, y: 3, width: 30, height: 9 }),
                box: { x: 60, y: 3, width: 30, height: 9 },
                areaMm2: 270,
              },
            ],
          },
          choices: ["#111111", "#EEEEEE"].map((colour) => ({
            colour,
            name: colour,
            stock: sheet,
            thickness: 3,
            hold: { kind: "bond", adhesive: cement },
            solid,
          })),
          site: inside,
          id,
        }),
  ),
  fc.record({ dx: number, dy: number, pick: fc.nat(5) }).map(
    ({ dx, dy, pick }): Edit =>
      (document) =>
        movePieces(document, { pieceIds: pieceIds(document, pick), dx, dy }),
  ),
  fc.record({ by: number, pick: fc.nat(5) }).map(
    ({ by, pick }): Edit =>
      (document) =>
        turnPieces(document, { pieceIds: pieceIds(document, pick), by }),
  ),
  fc.record({ by: number, pick: fc.nat(5) }).map(
    ({ by, pick }): Edit =>
      (document) =>
        scalePieces(document, { pieceIds: pieceIds(document, pick), by: by / 100 }),
  ),
  fc.record({ x: number, y: number, turn: number, scale: number, pick: fc.nat(5) }).map(
    ({ pick, ...to }): Edit =>
      (document) =>
        placePiece(document, { pieceId: pieceIds(document, pick)[0] ?? "none", ...to }),
  ),
  fc.record({ pick: fc.nat(5), way: fc.constantFrom("across", "down", "both") }).map(
    ({ pick, way }): Edit =>
      (document) =>
        centrePieces(document, { pieceIds: pieceIds(document, pick), way }),
  ),
  fc.nat(5).map(
    (pick): Edit =>
      (document) =>
        removePieces(document, { pieceIds: pieceIds(document, pick).slice(0, 1) }),
  ),
  fc.record({ key, towards: fc.constantFrom("viewer", "wall") }).map(
    (args): Edit =>
      (document) =>
        moveLayer(document, args),
  ),
  key.map(
    (layerKey): Edit =>
      (document) =>
        removeLayer(document, { key: layerKey }),
  ),
  fc.record({ key, name: fc.string(), stock, thickness: number }).map(
    (args): Edit =>
      (document) =>
        setLayer(document, args),
  ),
  fc.record({ key, hardware }).map(
    (args): Edit =>
      (document, id) =>
        standLayer(document, { ...args, site: inside, id }),
  ),
  key.map(
    (layerKey): Edit =>
      (document) =>
        bondLayer(document, { key: layerKey, adhesive: cement }),
  ),
  fc.record({ key, offset: number }).map(
    (args): Edit =>
      (document) =>
        raiseLayer(document, args),
  ),
  fc.record({ key, x: number, y: number }).map(
    (args): Edit =>
      (document, id) =>
        addHole(document, { ...args, site: inside, id }),
  ),
  fc.record({ pick: fc.nat(5), x: number, diameter: number }).map(
    ({ pick, ...to }): Edit =>
      (document) =>
        setHole(document, { holeId: holeId(document, pick), ...to }),
  ),
  fc.nat(5).map(
    (pick): Edit =>
      (document) =>
        removeHole(document, { holeId: holeId(document, pick) }),
  ),
  fc.nat(5).map(
    (pick): Edit =>
      (document) =>
        fixHole(document, { holeId: holeId(document, pick) }),
  ),
  key.map(
    (layerKey): Edit =>
      (document, id) =>
        proposeHoles(document, { key: layerKey, site: inside, id }),
  ),
  fc
    .record({
      width: number,
      height: number,
      thickness: number,
      quantity: number,
      viewingDistance: number,
      grainTurn: number,
      finish: fc.array(fc.constant(oil), { maxLength: 20 }),
    })
    .map(
      (fields): Edit =>
        (document) =>
          setBoard(document, { ...fields, stock: pine }),
    ),
);

describe("history", () => {
  it("leads back to the very start and forward again, through documents that are always valid, whatever is done", () => {
    fc.assert(
      fc.property(fc.array(edit, { minLength: 1, maxLength: 30 }), (edits) => {
        const start = emptyMockup();
        let history = startHistory(start);
        for (const [index, change] of edits.entries()) {
          const before = JSON.stringify(history.present);
          const next = change(history.present, `id${index}`);
          expect(JSON.stringify(history.present)).toBe(before);
          const parsed = documentSchema.safeParse(next);
          expect(parsed.error?.issues ?? []).toEqual([]);
          const steps = history.past.length;
          history = commit(history, next, { label: "Edit" });
          // Nothing is a step that changed nothing, and a change is always one.
          expect(history.past.length).toBe(JSON.stringify(next) === before ? steps : steps + 1);
        }
        const end = history.present;
        while (history.past.length > 0) history = undo(history);
        expect(history.present).toBe(start);
        while (history.future.length > 0) history = redo(history);
        expect(history.present).toBe(end);
      }),
      { numRuns: 300 },
    );
  });

  it("makes one step of taps with the same name, until something else is done or undone", () => {
    const widened = (width: number) => setBoard(emptyMockup(), { width });
    let history = startHistory(emptyMockup());
    for (const width of [601, 602, 603])
      history = commit(history, widened(width), { label: "Nudge", together: "nudge" });
    expect(history.past).toHaveLength(1);
    history = commit(history, widened(700), { label: "Board" });
    history = commit(history, widened(701), { label: "Nudge", together: "nudge" });
    expect(history.past).toHaveLength(3);
    history = commit(undo(history), widened(702), { label: "Nudge", together: "nudge" });
    expect(history.past).toHaveLength(3);
    expect(undo(undo(history)).present.board.width).toBe(603);
  });

  it("keeps the newest steps and lets go of the oldest", () => {
    let history = startHistory(emptyMockup());
    for (let step = 1; step <= mostSteps + 7; step++)
      history = commit(history, { ...history.present }, { label: `Step ${step}` });
    expect(history.past).toHaveLength(mostSteps);
    expect(history.past[0]?.label).toBe("Step 8");
    const start = goToStep(history, 0);
    expect(start.future).toHaveLength(mostSteps);
    expect(goToStep(start, mostSteps)).toEqual(history);
  });

  it("tells its steps in words, and goes to any of them, back and forward, without losing one", () => {
    const start = emptyMockup();
    let history = startHistory(start);
    for (const width of [610, 620, 630, 640])
      history = commit(history, setBoard(history.present, { width }), { label: `Width ${width}` });
    const widthAt = (position: number) => goToStep(history, position).present.board.width;
    expect([0, 1, 2, 3, 4].map(widthAt)).toEqual([600, 610, 620, 630, 640]);
    const back = goToStep(history, 1);
    expect(back).toEqual(undo(undo(undo(history))));
    expect(stepsInWords(back)).toEqual([
      { position: 4, label: "Width 640", isUndone: true },
      { position: 3, label: "Width 630", isUndone: true },
      { position: 2, label: "Width 620", isUndone: true },
      { position: 1, label: "Width 610", isUndone: false },
    ]);
    expect(goToStep(back, 4)).toEqual(history);
    expect(goToStep(goToStep(history, 0), 3).present).toBe(undo(history).present);
    expect(goToStep(history, 0).present).toBe(start);
    expect(goToStep(back, 1)).toBe(back);
    expect(goToStep(history, 5)).toBe(history);
  });

  it("stays the same when nothing changed or nothing is left", () => {
    const history = startHistory(emptyMockup());
    expect(commit(history, history.present, { label: "None" })).toBe(history);
    expect(undo(history)).toBe(history);
    expect(redo(history)).toBe(history);
  });
});
