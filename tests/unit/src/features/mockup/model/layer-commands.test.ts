import { describe, expect, it } from "vitest";
import { applyMend } from "#shared/dry-fit/apply-mend.ts";
import type { MendStep } from "#shared/dry-fit/mend.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { documentSchema, type Layer, type Lettering, type MockupDocument } from "#shared/mockup/document.ts";
import { splitLayer } from "#shared/mockup/split-layer.ts";
import { addLayer, doubleLayer } from "@/features/mockup/model/commands/add-layer.ts";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import {
  addHole,
  fitHoles,
  fixHole,
  proposeHoles,
  removeHole,
  setHole,
} from "@/features/mockup/model/commands/holes.ts";
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
import {
  bondLayer,
  letInLayer,
  raiseLayer,
  setPocket,
  setTack,
  standLayer,
} from "@/features/mockup/model/commands/set-hold.ts";
import { setLayer } from "@/features/mockup/model/commands/set-layer.ts";
import { setReads } from "@/features/mockup/model/commands/set-reads.ts";
import { hideLayer, lockLayer } from "@/features/mockup/model/commands/show-layer.ts";
import { barrel, brass, cement, chalk, emptyMockup, epoxy, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

const bonded = { stock: brass, thickness: 3, hold: { kind: "bond", adhesive: cement } } as const;

/** B: a disc on four standoffs. C: two squares, one of them a letter, bonded. */
function sign(): MockupDocument {
  const disc = addPlate(emptyMockup(), {
    shape: { kind: "circle", diameter: 275 },
    site: inside,
    id: "disc",
    name: "Night disc",
    stock: midnight,
    thickness: 4.5,
    hold: { kind: "standoff", hardware: barrel(19) },
  });
  const square = (id: string, x: number): Layer["pieces"][number] => ({
    id,
    name: "",
    source: { kind: "plate" },
    path: rectanglePath({ x: -10, y: -10, width: 20, height: 20 }).map(({ start, segments }) => ({
      start,
      segments: [...segments],
    })),
    placement: { x, y: 200, turn: 0, scale: 1, mirrored: false },
    reads: "",
  });
  const letter = {
    ...square("o", 250),
    source: { kind: "lettering" as const, letteringId: "words", letter: 0, laid: { x: 0, y: 0, turn: 0 } },
    reads: "O",
  };
  return {
    ...addLayer(disc, { ...bonded, name: "Letters", id: "l", site: inside, pieces: [letter, square("bar", 300)] }),
    lettering: [words],
  };
}

const words: Lettering = {
  id: "words",
  words: "O",
  face: "plain",
  fontSha256: "0".repeat(64),
  capHeight: 20,
  letterSpacing: 0,
  kerning: true,
  lineSpacing: 30,
  align: "left",
  along: { kind: "line" },
};

const layerOf = (document: MockupDocument, key: string) => document.layers.find((layer) => layer.key === key);
const keysOf = ({ layers }: MockupDocument) => layers.map(({ key }) => key).join("");

describe("an empty layer", () => {
  it("is added with the next free key, where it shall lie, and a document takes it", () => {
    const at = (place: Parameters<typeof addLayer>[1]["place"] & {}) =>
      addLayer(sign(), { ...bonded, name: "Back plate", id: "e", site: inside, place });
    expect(keysOf(at("wall"))).toBe("DBC");
    expect(keysOf(at({ under: "C" }))).toBe("BDC");
    expect(keysOf(at("viewer"))).toBe("BCD");
    expect(layerOf(at("wall"), "D")).toMatchObject({ name: "Back plate", thickness: 3, pieces: [], locked: false });
    expect(documentSchema.safeParse(at("wall")).error?.issues ?? []).toEqual([]);
  });

  it("is not added under a layer that is not there, nor to a document that is full", () => {
    const add = (document: MockupDocument) =>
      addLayer(document, { ...bonded, name: "More", id: "e", site: inside, place: { under: "B" } });
    const start = sign();
    expect(addLayer(start, { ...bonded, name: "More", id: "e", site: inside, place: { under: "Q" } })).toBe(start);
    let full = start;
    while (full.layers.length < 60) full = add(full);
    expect(add(full)).toBe(full);
  });
});

describe("a layer's double", () => {
  it("lies right over it with ids, a key and a name of its own, and is otherwise the same", () => {
    const doubled = doubleLayer(sign(), { key: "B", id: "n" });
    expect(keysOf(doubled)).toBe("BDC");
    const [was, now] = [layerOf(doubled, "B"), layerOf(doubled, "D")];
    if (was?.hold.kind !== "standoff" || now?.hold.kind !== "standoff") throw new Error("No standoffs.");
    expect(now.name).toBe("Night disc 2");
    expect(now.pieces.map(({ id }) => id)).toEqual(["n-1"]);
    expect(now.hold.holes.map(({ id }) => id)).toEqual(["n-h1", "n-h2", "n-h3", "n-h4"]);
    expect(now.hold.holes.map(({ x, y, fixed }) => ({ x, y, fixed }))).toEqual(
      was.hold.holes.map(({ x, y, fixed }) => ({ x, y, fixed })),
    );
    expect(now.pieces[0]?.path).toEqual(was.pieces[0]?.path);
    expect(documentSchema.safeParse(doubled).error?.issues ?? []).toEqual([]);
    expect(layerOf(doubleLayer(doubled, { key: "B", id: "m" }), "E")?.name).toBe("Night disc 3");
  });

  it("has words of its own, so that setting either anew leaves the other", () => {
    const doubled = doubleLayer(sign(), { key: "C", id: "n" });
    expect(doubled.lettering.map(({ id }) => id)).toEqual(["words", "n-l1"]);
    expect(layerOf(doubled, "D")?.pieces[0]?.source).toMatchObject({ letteringId: "n-l1" });
    expect(removeLayer(doubled, { key: "D" }).lettering).toEqual([words]);
    expect(removePieces(sign(), { pieceIds: ["o"] }).lettering).toEqual([]);
  });

  it("is not locked when the layer is, and does not come to be when there is no room", () => {
    const locked = lockLayer(sign(), { key: "C", locked: true });
    expect(layerOf(doubleLayer(locked, { key: "C", id: "n" }), "D")?.locked).toBe(false);
    let full = sign();
    for (let count = 0; full.layers.length < 60; count++) full = doubleLayer(full, { key: "C", id: `n${count}` });
    expect(doubleLayer(full, { key: "C", id: "last" })).toBe(full);
    expect(doubleLayer(full, { key: "Q", id: "last" })).toBe(full);
  });
});

describe("a locked layer", () => {
  const locked = ["B", "C"].reduce((document, key) => lockLayer(document, { key, locked: true }), sign());
  const disc = layerOf(locked, "B");
  const hole = disc?.hold.kind === "standoff" ? disc.hold.holes[1]?.id : undefined;
  const pieceIds = ["disc", "o", "bar"];
  const holeId = hole ?? "none";
  const mend = (step: MendStep) => (document: MockupDocument) => applyMend(document, { label: "Mend", steps: [step] });
  const site = inside;
  const changes: Record<string, (document: MockupDocument) => MockupDocument> = {
    moved: (document) => movePieces(document, { pieceIds, dx: 5, dy: 5 }),
    turned: (document) => turnPieces(document, { pieceIds, by: 15 }),
    sized: (document) => scalePieces(document, { pieceIds, by: 2 }),
    placed: (document) => placePiece(document, { pieceId: "o", x: 1, turn: 30, scale: 2 }),
    centred: (document) => centrePieces(document, { pieceIds: ["o"], way: "both" }),
    emptied: (document) => removePieces(document, { pieceIds }),
    removed: (document) => removeLayer(document, { key: "B" }),
    read: (document) => setReads(document, new Map([["bar", "I"]])),
    renamed: (document) => setLayer(document, { key: "B", name: "Day disc" }),
    "cut from other stock": (document) => setLayer(document, { key: "C", stock: chalk, thickness: 5 }),
    bonded: (document) => bondLayer(document, { key: "B", adhesive: epoxy }),
    "let in": (document) => letInLayer(document, { key: "C", adhesive: epoxy }),
    "let in deeper": (document) => setPocket(document, { key: "C", depth: 2 }),
    tacked: (document) => setTack(document, { key: "C", tack: epoxy }),
    "stood off": (document) => standLayer(document, { key: "C", hardware: barrel(25), id: "s", site }),
    raised: (document) => raiseLayer(document, { key: "B", offset: 33 }),
    "given a hole": (document) => addHole(document, { key: "B", id: "h", x: 300, y: 200, site }),
    "given holes": (document) => proposeHoles(document, { key: "B", id: "h", site }),
    fitted: (document) => fitHoles(document, { key: "B", site }),
    "moved by a hole": (document) => setHole(document, { holeId, x: 1, diameter: 9 }),
    "rid of a hole": (document) => removeHole(document, { holeId }),
    "fixed by another hole": (document) => fixHole(document, { holeId }),
    parted: (document) => splitLayer(document, { layerKey: "C", pieceIds: ["o"] }),
    "mended by a move": mend({ kind: "move pieces", pieceIds, dx: 3, dy: 0 }),
    "mended by leaving out": mend({ kind: "drop pieces", pieceIds: ["o"] }),
    "mended by its stock": mend({ kind: "stock", layerKey: "C", stock: chalk }),
    "mended by a new layer": mend({ kind: "split layer", layerKey: "C", pieceIds: ["o"] }),
    "mended by its offset": mend({ kind: "offset", layerKey: "B", offset: 12 }),
  };

  it.each(Object.entries(changes))("is not %s, which an unlocked one is", (name, change) => {
    const after = change(locked);
    for (const key of ["B", "C"]) expect(layerOf(after, key)).toBe(layerOf(locked, key));
    expect(after.layers).toHaveLength(2);
    expect(after.lettering).toBe(locked.lettering);
    const open = sign();
    const pocketed = name === "let in deeper" ? letInLayer(open, { key: "C", adhesive: epoxy }) : open;
    const wide = name === "fitted" ? setHole(pocketed, { holeId, diameter: 30 }) : pocketed;
    expect(change(wide)).not.toBe(wide);
  });

  it("is ordered, hidden and unlocked, and moves with the board that grows under it", () => {
    expect(keysOf(moveLayer(locked, { key: "B", towards: "viewer" }))).toBe("CB");
    expect(layerOf(hideLayer(locked, { key: "B", hidden: true }), "B")?.hidden).toBe(true);
    expect(layerOf(lockLayer(locked, { key: "B", locked: false }), "B")).toEqual(layerOf(sign(), "B"));
    const wider = setBoard(locked, { width: 700 });
    expect(layerOf(wider, "B")?.pieces[0]?.placement.x).toBe(350);
    expect(layerOf(wider, "B")?.locked).toBe(true);
  });

  it("stays the same object when it is locked or hidden twice", () => {
    expect(lockLayer(locked, { key: "B", locked: true })).toBe(locked);
    expect(hideLayer(locked, { key: "B", hidden: false })).toBe(locked);
  });
});
