// @vitest-environment jsdom
import { act } from "react";
import { beforeEach, describe, expect, it } from "vitest";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { chooseAllPieces, chooseLayer, choosePiece, type Selection } from "@/features/mockup/model/selection.ts";
import { button, field, press, type, until } from "../../support/render.tsx";
import {
  control,
  page,
  pick,
  placementOf,
  present,
  pressKey,
  said,
  showSetOut,
  threeAndOne,
  typeThen,
} from "./set-out-page.tsx";

const document0 = threeAndOne();
const someOf = (...pieceIds: string[]): Selection => ({ layerKey: "B", pieceIds, holeId: null });
const strip = () => control("Place of what is chosen", HTMLElement).textContent ?? "";
const value = (name: string) => control(name, HTMLInputElement).value;

beforeEach(() => localStorage.clear());

describe("the line of figures", () => {
  it("says what is chosen and places, sizes, turns and mirrors it as a whole", async () => {
    await showSetOut(document0, { chosen: someOf("a", "b") });
    expect(strip()).toContain("2 pieces of B");
    // From 40 to 110 across and from 50 to 90 down.
    expect([value("x of what is chosen"), value("y of what is chosen")]).toEqual(["75", "70"]);
    expect([value("Width of what is chosen"), value("Height of what is chosen")]).toEqual(["70", "40"]);
    await typeThen("Width of what is chosen", "35", "Enter");
    expect(value("Height of what is chosen")).toBe("20");
    expect(placementOf("a")).toMatchObject({ x: 62.5, y: 65, scale: 0.5 });
    await pressKey("Ctrl z");
    await pick("Measured at", "1");
    await typeThen("x of what is chosen", "2 in", "Enter");
    expect(placementOf("a")?.x).toBe(60.8);
    expect(value("x of what is chosen")).toBe("50.8");
    await typeThen("Turn what is chosen by, degrees", "180", "Enter");
    expect(placementOf("b")).toMatchObject({ x: 60.8, y: 60, turn: 180 });
    await press(button("mirror across"));
    expect(placementOf("b")).toMatchObject({ x: 110.8, mirrored: true });
    expect(said()).toBe("Mirror across");
  });

  it("turns one piece to what is typed", async () => {
    await showSetOut(document0, { chosen: choosePiece(document0, "d") });
    expect(strip()).toContain("C, Layer C");
    await typeThen("Turn of what is chosen, degrees", "−30", "Enter");
    expect(placementOf("d")).toEqual({ x: 500, y: 300, turn: 330, scale: 1, mirrored: false });
    expect(value("Turn of what is chosen, degrees")).toBe("330°");
  });

  it("letters sixty-fourths of an inch and takes them", async () => {
    await showSetOut(document0, { chosen: someOf("a"), desk: { unit: "in" } });
    await typeThen("x of what is chosen", "1 3/64", "Enter");
    expect(placementOf("a")?.x).toBeCloseTo((25.4 * 67) / 64, 9);
    expect(value("x of what is chosen")).toBe("1 3/64″");
  });

  it("says what to do when nothing is chosen, and why what is locked stays", async () => {
    await showSetOut(document0);
    expect(strip()).toContain("Choose a layer by its key in the schedule");
    await showSetOut(document0, { chosen: chooseLayer(document0, "D") });
    expect(strip()).toContain("D is locked. Unlock it first.");
    expect(control("x of what is chosen", HTMLInputElement).disabled).toBe(true);
    await press(button("line up"));
    expect(said()).toBe("D is locked. Unlock it first.");
  });
});

describe("lining up", () => {
  it("lines pieces up with the first chosen, and says when they lie so already", async () => {
    await showSetOut(document0, { chosen: someOf("b", "a") });
    await press(button("line up"));
    await pick("With", "the first chosen");
    await press(button("top"));
    expect(placementOf("a")).toMatchObject({ x: 50, y: 80 });
    expect(said()).toBe("Line up top with the first chosen");
    await press(button("top"));
    expect(said()).toBe("They lie so already: top, with the first chosen.");
  });

  it("moves layers as one when whole layers are chosen, and leaves the locked one", async () => {
    const pieceIds = ["a", "b", "c", "d", "e"];
    await showSetOut(document0, { chosen: someOf(...pieceIds) });
    await press(button("line up"));
    await pick("With", "the board");
    await press(button("left"));
    expect(pieceIds.map((id) => placementOf(id)?.x)).toEqual([10, 60, 260, 20, 400]);
  });
});

describe("centring", () => {
  it("brings what is chosen to the board's middle both ways", async () => {
    await showSetOut(document0, { chosen: someOf("a") });
    await act(async () => {
      button("centre on board").dispatchEvent(new KeyboardEvent("keydown", { key: "Enter", bubbles: true }));
    });
    const item = await until(() => document.querySelector<HTMLElement>('[role="menuitem"]'));
    expect(item.textContent).toBe("across and down");
    await press(item);
    expect(placementOf("a")).toMatchObject({ x: 300, y: 200 });
  });
});

describe("stepping off", () => {
  const why = () =>
    [...document.querySelectorAll('[role="dialog"] [role="status"]')].map((one) => one.textContent).join();

  it("offers three chosen pieces equal gaps between the first and the last", async () => {
    await showSetOut(document0, { chosen: someOf("a", "b", "c") });
    await press(button("step off"));
    await pick("What", "chosen");
    await pick("How far apart", "equal gaps");
    await press(submit());
    // From 50 to 300, the middle one half way.
    expect(placementOf("b")).toMatchObject({ x: 175, y: 80 });
    expect(document.querySelector('[role="dialog"]')).toBeNull();
  });

  it("copies one piece round the board's middle and chooses all of them", async () => {
    await showSetOut(document0, { chosen: someOf("a") });
    await press(button("step off"));
    await pick("Where", "round");
    await type(field("Copies"), "11");
    expect(why()).toBe("");
    await press(submit());
    const pieces = present().layers[0]?.pieces ?? [];
    expect(pieces).toHaveLength(14);
    expect(page().editor.selection.pieceIds).toHaveLength(12);
    expect(pieces.slice(3).map(({ placement }) => placement.turn)).toEqual([
      30, 60, 90, 120, 150, 180, 210, 240, 270, 300, 330,
    ]);
    expect(said()).toBe("Step off 11 copies");
    expect(documentSchema.parse(present())).toEqual(present());
  });

  it.each([
    { name: "no copies", label: "Copies", text: "0", words: "Write how many copies, from 1 to 500." },
    { name: "no length", label: "Gap", text: "", words: "Write how far apart they stand." },
  ])("says what is missing: $name", async ({ label, text, words }) => {
    await showSetOut(document0, { chosen: someOf("a") });
    await press(button("step off"));
    await type(field(label), text);
    expect(why()).toBe(words);
    expect(submit().disabled).toBe(true);
  });

  it("asks for a radius where a piece lies on the centre", async () => {
    await showSetOut(document0, { chosen: someOf("a") });
    await press(button("step off"));
    await pick("Where", "round");
    await pick("Centre", "chosen");
    expect(why()).toBe("It lies on the centre itself: write a radius.");
    await type(field("Radius"), "40");
    expect(why()).toBe("");
  });
});

function submit(): HTMLButtonElement {
  const found = document.querySelector('[role="dialog"] button[type="submit"]');
  if (!(found instanceof HTMLButtonElement)) throw new Error("no dialog is open");
  return found;
}

describe("copying and pasting", () => {
  const bigger: MockupDocument = { ...threeAndOne(), layers: [] };

  it("brings what was copied into another job of the client, and into none of another client", async () => {
    await showSetOut(document0, { chosen: chooseAllPieces(document0) });
    await press(button("copy"));
    expect(said()).toBe("4 pieces copied, to be pasted in any job of Any client.");
    await showSetOut(bigger);
    await pressKey("Ctrl v");
    expect(present().layers.map(({ key, pieces }) => [key, pieces.length])).toEqual([
      ["B", 3],
      ["C", 1],
    ]);
    expect(said()).toBe("Paste 4 pieces");
    for (const place of [
      { personId: "person", shop: "shop", clientId: "another client" },
      { personId: "person", shop: "another shop", clientId: "client" },
    ]) {
      await showSetOut(bigger, { desk: { copyPlace: place } });
      await pressKey("Ctrl v");
      expect(present()).toBe(bigger);
    }
  });

  it("refuses in words what somebody else wrote there", async () => {
    localStorage.setItem(
      "standproud:copied:person:shop:client",
      '{"version":1,"wholeKeys":[],"document":{"version":4}}',
    );
    await showSetOut(document0, { chosen: someOf("a") });
    await press(button("paste"));
    expect(said()).toContain("What was copied can’t be taken:");
    expect(present()).toBe(document0);
  });
});
