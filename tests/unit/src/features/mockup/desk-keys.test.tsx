// @vitest-environment jsdom
import { beforeEach, describe, expect, it } from "vitest";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Drag } from "@/features/mockup/model/drag.ts";
import { chooseHole, chooseLayer, choosePiece } from "@/features/mockup/model/selection.ts";
import { deskKeys } from "@/features/mockup/panels/keys-list.ts";
import { barrel, emptyMockup } from "./sample-mockup.ts";
import {
  control,
  layerOf,
  page,
  pick,
  placementOf,
  plate,
  present,
  pressKey,
  said,
  showSetOut,
  threeAndOne,
  typeThen,
} from "./set-out-page.tsx";

const document0 = threeAndOne();
const chosen = choosePiece(document0, "a");
const idsOf = (index: number) => present().layers[index]?.pieces.map(({ id }) => id);
const dragging: Drag = { kind: "pieces", pieceIds: ["a"], dx: 5, dy: 5, guides: [], measures: [] };

/** What each key of the list does, by the place and the keys that the list letters. */
const shown: Readonly<Record<string, () => Promise<void>>> = {
  "On the drawing: Arrows": async () => {
    await showSetOut(document0, { chosen });
    await pick("An arrow key moves by", "0.5");
    for (const key of ["ArrowRight", "ArrowRight", "ArrowDown"]) await pressKey(key);
    expect(placementOf("a")).toMatchObject({ x: 51, y: 60.5 });
    expect(said()).toBe("Move pieces, x 51, y 60.5");
    for (const key of ["ArrowLeft", "ArrowUp"]) await pressKey(key);
    expect(placementOf("a")).toMatchObject({ x: 50.5, y: 60 });
    await pressKey("Escape");
    await pressKey("ArrowRight");
    expect(page().view).toEqual({ scale: 1, x: -48, y: 0 });
  },
  "On the drawing: Shift Arrows": async () => {
    await showSetOut(document0, { chosen });
    await pick("An arrow key moves by", "0.1");
    await pressKey("Shift ArrowLeft");
    expect(placementOf("a")?.x).toBe(49);
    // Remembered by the browser.
    expect(localStorage.getItem("standproud:arrow-step:mm")).toBe("0.1");
  },
  "On the drawing: Delete, Backspace": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("Delete");
    expect(idsOf(0)).toEqual(["b", "c"]);
    await showSetOut(document0, { chosen });
    await pressKey("Backspace");
    expect(idsOf(0)).toEqual(["b", "c"]);
  },
  "On the drawing: Ctrl A": async () => {
    await showSetOut(document0);
    await pressKey("Ctrl a");
    expect(page().editor.selection.pieceIds).toEqual(["a", "b", "c", "d"]);
  },
  "On the drawing: Escape": async () => {
    await showSetOut(document0, { chosen, startDrag: dragging });
    await pressKey("Escape");
    expect(page().drag).toBeNull();
    expect(page().editor.selection).toEqual(chosen);
    await pressKey("Escape");
    expect(page().editor.selection.pieceIds).toEqual([]);
    const ended: (string | null)[] = [];
    await showSetOut(document0, { chosen, desk: { holesByHand: "B", putHolesByHand: (key) => ended.push(key) } });
    await pressKey("Escape");
    expect(ended).toEqual([null]);
  },
  "On the drawing: +, −": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("+");
    expect(page().view?.scale).toBeCloseTo(1.4, 9);
    await pressKey("+");
    await pressKey("-");
    expect(page().view?.scale).toBeCloseTo(1.4, 9);
  },
  "On the drawing: 0": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("+");
    await pressKey("0");
    expect(page().view).toBeNull();
  },
  "On the drawing: 9": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("9");
    // 20 mm in 68 % of a window 500 px high; the piece's middle at 50, 60 comes into the window's at 500, 250.
    const near = (value: number) => expect.closeTo(value, 6);
    expect(page().view).toEqual({ scale: near(17), x: near(-350), y: near(-770) });
  },
  "Anywhere but in a field: Ctrl C": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("Ctrl c");
    expect(said()).toBe("1 piece copied, to be pasted in any job of Any client.");
    expect(present()).toBe(document0);
  },
  "Anywhere but in a field: Ctrl X": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("Ctrl x");
    expect(idsOf(0)).toEqual(["b", "c"]);
    await pressKey("Ctrl v");
    expect(present().layers.flatMap(({ pieces }) => pieces)).toHaveLength(5);
    expect(present().layers[0]?.pieces.at(-1)?.placement).toEqual({ x: 50, y: 60, turn: 0, scale: 1, mirrored: false });
  },
  "Anywhere but in a field: Ctrl V": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("Ctrl c");
    await pressKey("Ctrl v");
    expect(idsOf(0)).toHaveLength(4);
    expect(page().editor.selection.pieceIds).toEqual(idsOf(0)?.slice(3));
    await showSetOut(document0, { chosen: chooseLayer(document0, "C") });
    await pressKey("Ctrl c");
    await pressKey("Ctrl v");
    expect(present().layers.map(({ key, name }) => [key, name])).toEqual([
      ["B", "Layer B"],
      ["C", "Layer C"],
      ["D", "Layer D"],
      ["E", "Layer C 2"],
    ]);
  },
  "Anywhere but in a field: Ctrl Shift V": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("Ctrl c");
    await pressKey("Ctrl Shift V");
    expect(present().layers.map(({ key, pieces }) => [key, pieces.length])).toEqual([
      ["B", 3],
      ["C", 1],
      ["D", 1],
      ["E", 1],
    ]);
  },
  "Anywhere but in a field: Ctrl D": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("Ctrl d");
    const [, , , copy] = present().layers[0]?.pieces ?? [];
    expect(copy?.placement).toEqual({ x: 50, y: 60, turn: 0, scale: 1, mirrored: false });
    expect(page().editor.selection.pieceIds).toEqual([copy?.id]);
  },
  "Anywhere but in a field: Ctrl Z": async () => {
    await showSetOut(document0, { chosen });
    await pressKey("Delete");
    await pressKey("Ctrl z");
    expect(present()).toBe(document0);
    expect(said()).toBe("Undone: Remove pieces");
  },
  "Anywhere but in a field: Ctrl Shift Z, Ctrl Y": async () => {
    for (const keys of ["Ctrl Shift Z", "Ctrl y"]) {
      await showSetOut(document0, { chosen });
      await pressKey("Delete");
      await pressKey("Ctrl z");
      await pressKey(keys);
      expect(idsOf(0)).toEqual(["b", "c"]);
      expect(said()).toBe("Done again: Remove pieces");
    }
  },
  "Anywhere on the desk: F6, Shift F6": async () => {
    const focused = () => document.activeElement?.getAttribute("aria-label");
    await showSetOut(document0, { chosen });
    await pressKey("F6");
    expect(focused()).toBe("Place of what is chosen");
    await pressKey("F6", "x of what is chosen");
    expect(focused()).toBe("Head");
    await pressKey("Shift F6", "x of what is chosen");
    expect(focused()).toBe("Head");
    await pressKey("Shift F6", "Head");
    expect(focused()).toBe("Place of what is chosen");
    await pressKey("Shift F6", "A field");
    expect(focused()).toBe("Place of what is chosen");
    expect(page().editor.selection).toEqual(chosen);
    // It is no stop of Tab, nor one of the mouse: only while the key has brought the focus there.
    control("A field", HTMLInputElement).focus();
    expect(control("Place of what is chosen", HTMLElement).hasAttribute("tabindex")).toBe(false);
  },
  "In a cell of a list: Enter": async () => {
    await showSetOut(document0, { chosen });
    await typeThen("x of what is chosen", "77,5", "Enter");
    expect(placementOf("a")?.x).toBe(77.5);
  },
  "In a cell of a list: Escape": async () => {
    await showSetOut(document0, { chosen });
    await typeThen("x of what is chosen", "77", "Escape");
    expect(control("x of what is chosen", HTMLInputElement).value).toBe("50");
    expect(present()).toBe(document0);
    expect(page().editor.selection).toEqual(chosen);
  },
};

/** Shown by the section's own tests, or with a pointer. */
const shownElsewhere = ["On a layer in the section", "With the pointer"];

beforeEach(() => localStorage.clear());

describe("the list of keys", () => {
  const listed = deskKeys
    .filter(({ where }) => !shownElsewhere.includes(where))
    .flatMap(({ where, keys }) => keys.map(({ keys: lettered }) => `${where}: ${lettered}`));

  it("holds what is pressed here, and nothing more", () => {
    expect(listed.toSorted()).toEqual(Object.keys(shown).toSorted());
  });

  it.each(listed)("is true of %s", async (key) => {
    await shown[key]?.();
    expect.hasAssertions();
  });
});

describe("keys that have nothing to do", () => {
  it("say why when what is chosen is locked, and leave it", async () => {
    await showSetOut(document0, { chosen: chooseLayer(document0, "D") });
    await pressKey("ArrowRight");
    expect(said()).toBe("D is locked. Unlock it first.");
    await pressKey("Delete");
    expect(present()).toBe(document0);
  });

  it("move and remove a chosen hole, unless its layer is locked", async () => {
    const hold = {
      kind: "standoff" as const,
      hardware: barrel(19),
      offset: 19,
      holes: [
        { id: "h1", x: 50, y: 60, diameter: 6, fixed: true },
        { id: "h2", x: 55, y: 60, diameter: 6, fixed: false },
      ],
    };
    const ofHoles = (document: MockupDocument) => {
      const now = document.layers[0]?.hold;
      return now?.kind === "standoff" ? now.holes.map(({ id, x, y }) => [id, x, y]) : [];
    };
    const standing = emptyMockup({ layers: [layerOf("B", [plate("a", 50, 60)], { hold })] });
    const hole = chooseHole(standing, "h2");
    await showSetOut(standing, { chosen: hole });
    await pick("An arrow key moves by", "1");
    await pressKey("Shift ArrowDown");
    expect(said()).toBe("Move a hole, x 55, y 70");
    await typeThen("x of the chosen hole", "61.25", "Enter");
    expect(ofHoles(present())).toEqual([
      ["h1", 50, 60],
      ["h2", 61.25, 70],
    ]);
    await pressKey("Delete");
    expect(ofHoles(present())).toEqual([["h1", 50, 60]]);

    const shut = emptyMockup({ layers: [layerOf("B", [plate("a", 50, 60)], { hold, locked: true })] });
    await showSetOut(shut, { chosen: hole });
    for (const key of ["ArrowRight", "Delete"]) {
      await pressKey(key);
      expect(said()).toBe("B is locked. Unlock it first.");
    }
    expect(present()).toBe(shut);
  });

  it("leave copy, cut, paste and double to a field that has the focus", async () => {
    await showSetOut(document0, { chosen });
    for (const keys of ["Ctrl c", "Ctrl x", "Ctrl d", "Ctrl v"]) await pressKey(keys, "A field");
    expect(localStorage).toHaveLength(0);
    expect(present()).toBe(document0);
  });

  it("say that nothing was copied yet", async () => {
    await showSetOut(document0, { chosen });
    await pressKey("Ctrl v");
    expect(said()).toBe("Nothing was copied yet in a job of Any client.");
  });
});
