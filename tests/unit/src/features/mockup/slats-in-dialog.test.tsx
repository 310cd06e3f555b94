// @vitest-environment jsdom
import { act, useReducer, useState } from "react";
import { afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { DeskContext } from "@/features/mockup/editor/desk-context.ts";
import type { BoardPort } from "@/features/mockup/engine/board-messages.ts";
import { layBoard } from "@/features/mockup/engine/lay-board.ts";
import { BoardWorkerContext } from "@/features/mockup/engine/use-laid-board.ts";
import { type Editor, nextEditor, startEditor } from "@/features/mockup/model/editor.ts";
import { BoardDialog } from "@/features/mockup/panels/board-dialog.tsx";
import { walnut } from "../../../../support/slat-signs.ts";
import { button, field, press, render, type, until } from "../../support/render.tsx";
import { buildDesk } from "./build-desk.ts";
import { emptyMockup, pine } from "./sample-mockup.ts";

let kernel: Kernel;
let editor: Editor;
let isOpen: boolean;
let ports: { open: number; closed: number };
let page: Awaited<ReturnType<typeof render>> | null = null;

/** Lays boards in this very process, a turn of the event loop later, as the worker does in its own. */
function portHere(): BoardPort {
  let listener: Parameters<BoardPort["addEventListener"]>[1] = () => undefined;
  ports.open += 1;
  return {
    postMessage: ({ sequence, sign }) => {
      setTimeout(() => listener({ data: { sequence, ok: true, laid: layBoard(sign, kernel) } }));
    },
    addEventListener: (_type, heard) => {
      listener = heard;
    },
    terminate: () => {
      ports.closed += 1;
    },
  };
}

function Page({ document }: { document: MockupDocument }) {
  const [held, dispatch] = useReducer(nextEditor, document, startEditor);
  const [open, setOpen] = useState(true);
  editor = held;
  isOpen = open;
  const woods = [
    { wood: pine, thicknessesMm: [12, 18, 20] },
    { wood: walnut, thicknessesMm: [18] },
  ];
  const desk = buildDesk(held, dispatch, { stock: { acrylics: [], woods, hardware: [], adhesives: [] } });
  return (
    <BoardWorkerContext value={portHere}>
      <DeskContext value={desk}>
        <BoardDialog open={open} onOpenChange={setOpen} />
      </DeskContext>
    </BoardWorkerContext>
  );
}

const show = async (document = emptyMockup()) => {
  page = await render(<Page document={document} />);
};
const present = () => editor.history.present;
const says = (text: string) => document.body.textContent?.includes(text) ?? false;
const hasField = (label: string) =>
  [...document.querySelectorAll("label")].some((one) => one.textContent?.trim() === label);

async function choose(label: string, option: string) {
  const found = [...document.querySelectorAll("label")].find((one) => one.textContent?.trim() === label);
  const select = found && document.getElementById(found.htmlFor);
  if (!(select instanceof HTMLSelectElement)) throw new Error(`no choice is labelled "${label}"`);
  const value = [...select.options].find(({ text }) => text === option)?.value;
  if (value === undefined) throw new Error(`"${label}" offers no "${option}"`);
  await act(async () => {
    Object.getOwnPropertyDescriptor(HTMLSelectElement.prototype, "value")?.set?.call(select, value);
    select.dispatchEvent(new Event("change", { bubbles: true }));
  });
}

/** The tables of the page ask for one; nothing here has a size that could change. */
class NoSizes implements ResizeObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
}

beforeAll(async () => {
  kernel = await loadKernel();
});
beforeEach(() => {
  globalThis.ResizeObserver ??= NoSizes;
  ports = { open: 0, closed: 0 };
});
afterEach(async () => {
  await page?.end();
  page = null;
});

describe("slats in the board's dialog", () => {
  it("are laid with what one begins with, shown, and taken with their frame in one step", async () => {
    await show();
    await choose("Backer is", "slats on a substrate");
    await choose("Wood of the slats", "Black walnut");
    await choose("Frame is", "of wood");
    // 12 + 9 less 0.3 of sanding.
    expect(field("Depth of the frame").value).toBe("20.7");
    await until(() => document.querySelector("figure svg"));
    // (281 + 400) mm of each side along the spine, a slat every 38 · √2: twelve whole ones and a part at either end.
    expect(says("28 slats, numbered as they are laid.")).toBe(true);
    await press(button("Change the board"));
    expect(isOpen).toBe(false);
    expect(editor.history.past.map(({ label }) => label)).toEqual(["Change the board"]);
    expect(present().backer).toMatchObject({ stock: pine, thickness: 12, slats: { stock: walnut, slatWidth: 38 } });
    expect(present().frame).toEqual({ stock: pine, width: 18, depth: 20.7, mitred: true });
    expect(ports).toEqual({ open: 1, closed: 1 });
  });

  it("lose nothing that was typed while the backer was a plank for a moment", async () => {
    await show();
    await choose("Backer is", "slats on a substrate");
    await type(field("Angle to the spine"), "60");
    await type(field("Gap between slats"), "3");
    await choose("Backer is", "a plank");
    expect(hasField("Angle to the spine")).toBe(false);
    await choose("Thickness, mm", "18");
    await choose("Backer is", "slats on a substrate");
    expect(field("Angle to the spine").value).toBe("60");
    expect(field("Gap between slats").value).toBe("3");
    await choose("Backer is", "a plank");
    await press(button("Change the board"));
    expect(present().backer).toMatchObject({ thickness: 18, slats: null });
  });

  it("are refused in words at the field, and the board stays as it was", async () => {
    await show();
    await choose("Backer is", "slats on a substrate");
    await type(field("Width of a slat"), "401");
    expect(field("Width of a slat").getAttribute("aria-invalid")).toBe("true");
    expect(says("A slat of 401 mm is wider than the board: choose 400 mm at most.")).toBe(true);
    await type(field("Width of a slat"), "38");
    await type(field("Angle to the spine"), "14");
    expect(says("From 15 to 90 degrees.")).toBe(true);
    await press(button("Change the board"));
    expect(isOpen).toBe(true);
    expect(editor.history.past).toEqual([]);
  });

  it("tell what their start leaves, and take the best one there is", async () => {
    await show();
    await choose("Backer is", "slats on a substrate");
    await until(() => says("inside the lower edge at the spine"));
    await press(button("Take the best start"));
    expect(says("Over the lower edge")).toBe(true);
    const best = Number(field("Over the lower edge").value);
    await until(() => says("This is the best start"));
    expect(says("no sliver")).toBe(true);
    await press(button("Change the board"));
    expect(present().backer.slats?.start).toEqual({ kind: "height", height: best });
  });

  it("ask only for what their pattern has", async () => {
    await show();
    await choose("Backer is", "slats on a substrate");
    expect(hasField("Width of the spine")).toBe(true);
    await choose("Pattern", "mitred to each other");
    expect([hasField("Width of the spine"), hasField("Mitres right of middle")]).toEqual([false, true]);
    await choose("Pattern", "one direction");
    expect([hasField("Width of the spine"), hasField("Mitres right of middle")]).toEqual([false, false]);
    expect(hasField("Angle to the upright")).toBe(true);
  });
});

describe("a frame in the board's dialog", () => {
  it("is flush with the face at a press", async () => {
    await show();
    await choose("Frame is", "of wood");
    expect(field("Depth of the frame").value).toBe("20");
    await type(field("Depth of the frame"), "32");
    await press(button("Make it flush with the face"));
    expect(field("Depth of the frame").value).toBe("20");
    expect(button("The frame is flush with the face").getAttribute("aria-disabled")).toBe("true");
  });

  it("leaves less for the body when the measures mean overall, and both are told", async () => {
    await show();
    await choose("Frame is", "of wood");
    expect(says("Body 600 × 400 mm, overall 636 × 436 mm.")).toBe(true);
    await choose("Measures mean", "overall, with the frame");
    expect(says("Body 564 × 364 mm, overall 600 × 400 mm.")).toBe(true);
    await press(button("Change the board"));
    expect(present().board).toMatchObject({ width: 564, height: 364, measures: "overall" });
  });

  it("is refused in words on a round board", async () => {
    await show();
    await choose("Frame is", "of wood");
    await choose("Outline", "ellipse, or a circle");
    expect(says("A frame is made of straight pieces, and this board has round edges.")).toBe(true);
    await press(button("Change the board"));
    expect(isOpen).toBe(true);
  });
});
