// @vitest-environment jsdom
import { act } from "react";
import { describe, expect, it } from "vitest";
import { useUndoKeys } from "@/features/mockup/editor/use-undo-keys.ts";
import { CellText } from "@/features/mockup/panels/cell-controls.tsx";
import { render } from "../../../support/render.tsx";

const steps: string[] = [];
const step = ({ kind }: { readonly kind: "undo" | "redo" }) => void steps.push(kind);

function Harness() {
  useUndoKeys(step);
  return (
    <>
      <CellText aria-label="Name of B" value="Disc" onCommit={() => null} />
      <textarea aria-label="Message" />
    </>
  );
}

const press = (on: Element, shiftKey = false) =>
  act(
    async () =>
      void on.dispatchEvent(new KeyboardEvent("keydown", { key: "z", ctrlKey: true, shiftKey, bubbles: true })),
  );

describe("undo by keys", () => {
  it("steps the desk from a cell that nothing was typed in, and is the cell's own while something is", async () => {
    steps.length = 0;
    await render(<Harness />);
    const cell = document.querySelector("input");
    if (!cell) throw new Error("no cell is drawn");
    await press(cell);
    await press(cell, true);
    expect(steps).toEqual(["undo", "redo"]);
    await act(async () => {
      Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, "value")?.set?.call(cell, "Night d");
      cell.dispatchEvent(new Event("input", { bubbles: true }));
    });
    await press(cell);
    expect(steps).toEqual(["undo", "redo"]);
  });

  it("leaves a text area its own", async () => {
    steps.length = 0;
    await render(<Harness />);
    const message = document.querySelector("textarea");
    if (!message) throw new Error("no text area is drawn");
    await press(message);
    expect(steps).toEqual([]);
  });
});
