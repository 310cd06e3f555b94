// @vitest-environment jsdom
import { act, useReducer, useState } from "react";
import { afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import type { MockupDocument, Piece } from "#shared/mockup/document.ts";
import { DeskContext } from "@/features/mockup/editor/desk-context.ts";
import type { ShapePort } from "@/features/mockup/engine/shape-messages.ts";
import { ShapeWorkerContext } from "@/features/mockup/engine/use-shaped.ts";
import { workShape } from "@/features/mockup/engine/work-shape.ts";
import { addLayer } from "@/features/mockup/model/commands/add-layer.ts";
import { type Editor, nextEditor, startEditor } from "@/features/mockup/model/editor.ts";
import { chooseLayer } from "@/features/mockup/model/selection.ts";
import { CutAwayDialog } from "@/features/mockup/panels/cut-away-dialog.tsx";
import { CutTools } from "@/features/mockup/panels/cut-tools.tsx";
import type { DeskDialog } from "@/features/mockup/panels/desk-dialogs.tsx";
import { JoinDialog } from "@/features/mockup/panels/join-dialog.tsx";
import { LayerTools } from "@/features/mockup/panels/layer-tools.tsx";
import { LooseBitsDialog } from "@/features/mockup/panels/loose-bits-dialog.tsx";
import { MarginDialog } from "@/features/mockup/panels/margin-dialog.tsx";
import { SplitDialog } from "@/features/mockup/panels/split-dialog.tsx";
import { button, field, press, render, type, until } from "../../support/render.tsx";
import { buildDesk } from "./build-desk.ts";
import { brass, cement, emptyMockup } from "./sample-mockup.ts";
import { inside } from "./sites.ts";

let kernel: Kernel;
let editor: Editor;
let said: string | null;
let choose: (key: string) => void;
let page: Awaited<ReturnType<typeof render>> | null = null;

/** Shapes pieces in this very process, a turn of the event loop later, as the worker does in its own. */
function portHere(): ShapePort {
  let listener: Parameters<ShapePort["addEventListener"]>[1] = () => undefined;
  return {
    postMessage: ({ sequence, task }) => {
      setTimeout(() => listener({ data: { sequence, ok: true, made: workShape(task, kernel) } }));
    },
    addEventListener: (_type, heard) => {
      listener = heard;
    },
    terminate: () => undefined,
  };
}

function Page({ document }: { document: MockupDocument }) {
  const [held, dispatch] = useReducer(nextEditor, document, startEditor);
  const [open, setOpen] = useState<DeskDialog | null>(null);
  editor = held;
  choose = (key) => dispatch({ kind: "choose", selection: chooseLayer(held.history.present, key) });
  const desk = buildDesk(held, dispatch, {
    stock: { acrylics: [{ acrylic: brass, thicknessesMm: [3] }], woods: [], hardware: [], adhesives: [cement] },
    say: (words) => {
      said = words;
    },
  });
  const at = (dialog: DeskDialog) => ({ open: open === dialog, onOpenChange: () => setOpen(null) });
  return (
    <ShapeWorkerContext value={portHere}>
      <DeskContext value={desk}>
        <CutTools onOpen={setOpen} />
        <LayerTools onBoard={() => undefined} />
        <MarginDialog {...at("margin")} />
        <JoinDialog {...at("join")} />
        <CutAwayDialog {...at("cut away")} />
        <LooseBitsDialog {...at("loose bits")} />
        <SplitDialog {...at("split")} />
      </DeskContext>
    </ShapeWorkerContext>
  );
}

const piece = (id: string, x: number, y: number, width: number, height: number): Piece => ({
  id,
  name: "",
  source: { kind: "plate" },
  path: rectanglePath({ x: -width / 2, y: -height / 2, width, height }).map(({ start, segments }) => ({
    start,
    segments: [...segments],
  })),
  placement: { x, y, turn: 0, scale: 1, mirrored: false },
  reads: "",
});

/** B: a bar of 100 × 50. C: two squares of 20 that overlap by 5, over the bar's right end. D: a panel of 1000 × 300. */
function sign(): MockupDocument {
  const layers = [
    [piece("bar", 300, 200, 100, 50)],
    [piece("one", 350, 200, 20, 20), piece("two", 365, 200, 20, 20)],
    [piece("panel", 300, 600, 1000, 300)],
  ];
  return layers.reduce(
    (document, pieces, index) =>
      addLayer(document, {
        name: `Layer ${index + 1}`,
        stock: brass,
        thickness: 3,
        hold: { kind: "bond", adhesive: cement },
        id: `l${index}`,
        site: inside,
        pieces,
      }),
    emptyMockup(),
  );
}

const status = () => document.querySelector('[role="status"]')?.textContent ?? "";
const layerOf = (key: string) => editor.history.present.layers.find((layer) => layer.key === key);
const labels = () => editor.history.past.map(({ label }) => label);
const start = async (key: string) => {
  page = await render(<Page document={sign()} />);
  await act(async () => choose(key));
};
/** Presses a button that waits for the shape to be worked out. */
async function pressReady(name: RegExp) {
  const ready = await until(() =>
    [...document.querySelectorAll("button")].find((one) => name.test(one.textContent ?? "") && !one.disabled),
  );
  await press(ready);
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
  said = null;
});
afterEach(async () => {
  await page?.end();
  page = null;
});

describe("the tools that cut", () => {
  it("say why they can't be used, and open nothing", async () => {
    page = await render(<Page document={sign()} />);
    await press(button("join"));
    expect(said).toBe("Choose a layer or pieces first.");
    expect(document.querySelector('[role="dialog"]')).toBeNull();
  });

  it("add a margin plate of the size that was shown, under what it follows", async () => {
    await start("B");
    await press(button("margin plate"));
    await until(() => status().startsWith("120 × 70 mm over all, 83.1 cm²"));
    await type(field("Margin"), "5");
    await until(() => status().startsWith("110 × 60 mm"));
    await pressReady(/^Add the margin plate$/);
    expect(labels()).toEqual(["Add a margin plate"]);
    expect(editor.history.present.layers.map(({ key }) => key)).toEqual(["E", "B", "C", "D"]);
    expect(layerOf("E")?.pieces[0]?.source).toMatchObject({ kind: "margin", margin: 5, corners: "round" });
    expect(editor.selection.layerKey).toBe("E");
  });

  it("join what overlaps", async () => {
    await start("C");
    await press(button("join"));
    await until(() => status() === "Of them 2 become one.");
    await pressReady(/^Join them$/);
    expect(layerOf("C")?.pieces).toHaveLength(1);
    expect(editor.selection.pieceIds).toEqual(layerOf("C")?.pieces.map(({ id }) => id));
  });

  it("cut away what lies over a layer", async () => {
    await start("B");
    await press(button("cut away"));
    // The square's left half lies over the bar, 10 × 20, the second one beside it.
    await until(() => status() === "1 piece loses 2 cm².");
    await type(field("Room all round"), "1");
    await until(() => status() === "1 piece loses 2.4 cm²." || null);
    await pressReady(/^Cut it away$/);
    expect(layerOf("B")?.pieces[0]).toMatchObject({ id: "bar", source: { kind: "worked", how: "cut away" } });
    expect(layerOf("C")?.pieces).toHaveLength(2);
  });

  it("list loose bits before they go", async () => {
    await start("C");
    await press(button("loose bits"));
    await until(() => status() === "Nothing of what is chosen is as small as that.");
    await type(field("Smaller than"), "500");
    await until(() => status() === "2 bits go. 2 pieces are nothing else and go with them.");
    const listed = [...document.querySelectorAll('ul[aria-label="Bits to drop"] li')].map((item) => item.textContent);
    expect(listed).toEqual(["Piece 1 of C: 20 × 20 mm, 4 cm²", "Piece 2 of C: 20 × 20 mm, 4 cm²"]);
    await pressReady(/^Drop 2 bits$/);
    expect(layerOf("C")?.pieces).toEqual([]);
  });

  it("split what is larger than the bed, and show the sizes of the parts", async () => {
    await start("D");
    await press(button("split to bed"));
    await until(() => status().startsWith("Part 1: 500 × 300 mm, goes on the bed"));
    await type(field("Seams moved by"), "450");
    await until(() => status().startsWith("Part 1: 950 × 300 mm, larger than the bed"));
    await type(field("Seams moved by"), "-100");
    await until(() => status().startsWith("Part 1: 400 × 300 mm, goes on the bed"));
    await pressReady(/^Split it in 2$/);
    expect(layerOf("D")?.pieces.map(({ name, placement }) => [name, placement.x])).toEqual([
      ["Part 1 of 2", 0],
      ["Part 2 of 2", 500],
    ]);
  });
});

describe("a layer's tools", () => {
  it("double, lock and unlock it, and remove it only when it is not locked", async () => {
    await start("C");
    await press(button("double layer"));
    expect(layerOf("E")).toMatchObject({ name: "Layer 4" });
    await press(button("lock"));
    expect(layerOf("E")?.locked).toBe(true);
    await press(button("remove"));
    expect(said).toBe("E is locked. Unlock it first.");
    expect(layerOf("E")?.pieces).toHaveLength(2);
    await press(button("unlock"));
    await press(button("remove"));
    expect(layerOf("E")).toBeUndefined();
    expect(labels()).toEqual(["Double layer C", "Lock E", "Unlock E", "Remove E"]);
  });

  it("add an empty one, right under the chosen one if so wished", async () => {
    await start("C");
    await press(button("add a layer"));
    await type(field("Name"), "Glow");
    await press(button("Add the layer"));
    expect(editor.history.present.layers.at(-1)).toMatchObject({ key: "E", name: "Glow", pieces: [] });
    expect(editor.selection.layerKey).toBe("E");
  });
});
