import { act, useReducer, useState } from "react";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import type { Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { useCanvasKeys } from "@/features/mockup/canvas/use-canvas-keys.ts";
import { type Desk, DeskContext } from "@/features/mockup/editor/desk-context.ts";
import { usePartKeys } from "@/features/mockup/editor/use-part-keys.ts";
import { useUndoKeys } from "@/features/mockup/editor/use-undo-keys.ts";
import { useVoice } from "@/features/mockup/editor/use-voice.ts";
import type { Drag } from "@/features/mockup/model/drag.ts";
import { type Editor, nextEditor, startEditor } from "@/features/mockup/model/editor.ts";
import { placeWords } from "@/features/mockup/model/place-words.ts";
import { nothingChosen, type Selection } from "@/features/mockup/model/selection.ts";
import type { DeskDialog } from "@/features/mockup/panels/desk-dialogs.tsx";
import { PlaceStrip } from "@/features/mockup/panels/place-strip.tsx";
import { SetOutTools } from "@/features/mockup/panels/set-out-tools.tsx";
import { StepOffDialog } from "@/features/mockup/panels/step-off-dialog.tsx";
import type { DrawingView } from "@/lib/drawing-view.ts";
import { render } from "../../support/render.tsx";
import { buildDesk } from "./build-desk.ts";
import { brass, cement, emptyMockup } from "./sample-mockup.ts";

export const plate = (id: string, x: number, y: number, side = 20): Piece => ({
  id,
  name: "",
  source: { kind: "plate" },
  path: rectanglePath({ x: -side / 2, y: -side / 2, width: side, height: side }).map(({ start, segments }) => ({
    start,
    segments: [...segments],
  })),
  placement: { x, y, turn: 0, scale: 1, mirrored: false },
  reads: "",
});

export const layerOf = (key: string, pieces: Piece[], fields: Partial<Layer> = {}): Layer => ({
  key,
  name: `Layer ${key}`,
  stock: brass,
  thickness: 3,
  hold: { kind: "bond", adhesive: cement, tack: null },
  locate: "none",
  marked: "not stated",
  pieces,
  hidden: false,
  locked: false,
  ...fields,
});

/** B of three plates of 20 mm at 50, 100 and 300 across, C of one of 40 mm, D locked. The board is 600 × 400. */
export const threeAndOne = (): MockupDocument =>
  emptyMockup({
    layers: [
      layerOf("B", [plate("a", 50, 60), plate("b", 100, 80), plate("c", 300, 200)]),
      layerOf("C", [plate("d", 500, 300, 40)]),
      layerOf("D", [plate("e", 400, 100)], { locked: true }),
    ],
  });

/** What the page holds, as it was last drawn. */
export type Held = { readonly editor: Editor; readonly view: DrawingView | null; readonly drag: Drag | null };
let held: Held;
export const page = (): Held => held;
export const present = (): MockupDocument => held.editor.history.present;
export const placementOf = (id: string) =>
  present()
    .layers.flatMap(({ pieces }) => pieces)
    .find((piece) => piece.id === id)?.placement;

const whole: DrawingView = { scale: 1, x: 0, y: 0 };
const room = { width: 1000, height: 500 };

type PageProps = {
  readonly document: MockupDocument;
  readonly chosen: Selection;
  readonly desk: Partial<Desk>;
  readonly startDrag: Drag | null;
};

/** The tools that set out, with a drawing that only hears keys. */
function SetOutPage({ document, chosen, desk, startDrag }: PageProps) {
  const [editor, dispatch] = useReducer(nextEditor, { ...startEditor(document), selection: chosen });
  const [dialog, setDialog] = useState<DeskDialog | null>(null);
  const [view, setView] = useState<DrawingView | null>(null);
  const [drag, setDrag] = useState<Drag | null>(startDrag);
  held = { editor, view, drag };
  useUndoKeys(dispatch);
  usePartKeys();
  const { said, say } = useVoice(editor.history, () => placeWords(editor.history.present, editor.selection, "mm"));
  return (
    <DeskContext value={buildDesk(editor, dispatch, { say, ...desk })}>
      <section aria-label="Head" data-desk-part />
      <Drawing view={view ?? whole} fit={whole} room={room} onView={setView} drag={drag} onDrag={setDrag} />
      <SetOutTools onOpen={setDialog} />
      <PlaceStrip said={said} />
      <StepOffDialog open={dialog === "step off"} onOpenChange={() => setDialog(null)} />
      <input aria-label="A field" defaultValue="words" />
    </DeskContext>
  );
}

function Drawing(looking: Parameters<typeof useCanvasKeys>[0]) {
  const handleKeyDown = useCanvasKeys(looking);
  return <div role="application" aria-label="Elevation" {...{ tabIndex: 0, onKeyDown: handleKeyDown }} />;
}

let last: { readonly end: () => Promise<void> } | null = null;

/** Puts the tools on the page, over a document with this choice, in place of those that were there. */
export async function showSetOut(
  document: MockupDocument,
  { chosen = nothingChosen, desk = {}, startDrag = null }: Partial<Omit<PageProps, "document">> = {},
) {
  // Its keys are heard by the window for as long as it is there.
  await last?.end();
  last = await render(<SetOutPage document={document} chosen={chosen} desk={desk} startDrag={startDrag} />);
}

/** The control of that name, by its aria-label. */
export function control<T extends HTMLElement>(name: string, kind: new () => T): T {
  const found = document.querySelector(`[aria-label="${name}"]`);
  if (!(found instanceof kind)) throw new Error(`no ${kind.name} is called "${name}"`);
  return found;
}

/** Presses a key, as "Ctrl Shift V" or "ArrowLeft", where the focus is said to be: on the drawing unless said otherwise. */
export async function pressKey(keys: string, on = "Elevation") {
  const parts = keys.split(" ");
  const key = parts.at(-1) ?? "";
  const target = control(on, HTMLElement);
  await act(async () => {
    target.focus();
    target.dispatchEvent(
      new KeyboardEvent("keydown", {
        key,
        ctrlKey: parts.includes("Ctrl"),
        shiftKey: parts.includes("Shift"),
        bubbles: true,
        cancelable: true,
      }),
    );
  });
}

export const said = (): string => document.querySelector('[role="status"]')?.textContent ?? "";

/** Picks one of the choices of a select, by its aria-label or its label. */
export async function pick(name: string, value: string) {
  const label = [...document.querySelectorAll("label")].find((one) => one.textContent?.trim() === name);
  const select = label ? document.getElementById(label.htmlFor) : document.querySelector(`[aria-label="${name}"]`);
  if (!(select instanceof HTMLSelectElement)) throw new Error(`no choice is called "${name}"`);
  await act(async () => {
    Object.getOwnPropertyDescriptor(HTMLSelectElement.prototype, "value")?.set?.call(select, value);
    select.dispatchEvent(new Event("change", { bubbles: true }));
  });
}

/** Types into a cell and presses a key there, without leaving it. */
export async function typeThen(name: string, text: string, key: "Enter" | "Escape") {
  const cell = control(name, HTMLInputElement);
  await act(async () => {
    cell.focus();
    Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, "value")?.set?.call(cell, text);
    cell.dispatchEvent(new Event("input", { bubbles: true }));
  });
  await act(async () => {
    cell.dispatchEvent(new KeyboardEvent("keydown", { key, bubbles: true, cancelable: true }));
  });
}
