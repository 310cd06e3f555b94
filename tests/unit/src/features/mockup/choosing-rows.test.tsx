// @vitest-environment jsdom
import { act } from "react";
import { describe, expect, it } from "vitest";
import { DeskContext } from "@/features/mockup/editor/desk-context.ts";
import { startEditor } from "@/features/mockup/model/editor.ts";
import { choosePiece, type Selection } from "@/features/mockup/model/selection.ts";
import { ScheduleRow } from "@/features/mockup/panels/schedule-row.tsx";
import { button, press, render, type } from "../../support/render.tsx";
import { buildDesk } from "./build-desk.ts";
import { emptyMockup } from "./sample-mockup.ts";
import { control, layerOf, plate } from "./set-out-page.tsx";

const B = layerOf("B", [plate("a", 50, 60), plate("b", 90, 60)]);
const C = layerOf("C", [plate("c", 200, 60)]);
const document0 = emptyMockup({ layers: [B, C] });

/** Draws the row of C while one piece of B is chosen, and tells what is chosen from then on. */
async function showRow(): Promise<Selection[]> {
  const chosen: Selection[] = [];
  const editor = { ...startEditor(document0), selection: choosePiece(document0, "a") };
  const desk = buildDesk(editor, () => undefined, { choose: (selection) => chosen.push(selection) });
  await render(
    <DeskContext value={desk}>
      <table>
        <tbody>
          <ScheduleRow layer={C} figures={null} />
        </tbody>
      </table>
    </DeskContext>,
  );
  return chosen;
}
const wholeC = { layerKey: "C", pieceIds: ["c"], holeId: null };

describe("a row of the schedule", () => {
  it("leaves what is chosen to a hand that passes by Tab", async () => {
    const chosen = await showRow();
    for (const element of document.querySelectorAll<HTMLElement>("tr input, tr select, tr button"))
      await act(async () => element.focus());
    expect(chosen).toEqual([]);
  });

  it("is chosen by a press into one of its cells, and by what is typed there", async () => {
    const pressed = await showRow();
    const name = control("Name of C", HTMLInputElement);
    await act(async () => name.dispatchEvent(new Event("pointerdown", { bubbles: true })));
    expect(pressed).toEqual([wholeC]);
    const typed = await showRow();
    await type(control("Name of C", HTMLInputElement), "Moon");
    expect(typed[0]).toEqual(wholeC);
  });

  it("is not chosen before its cell heard what was typed: drawn again in between, the cell would lose it", async () => {
    const chosen = await showRow();
    // A browser lets React draw between two listeners of one event. This one is called between those of the row and the cell.
    const before: number[] = [];
    const name = control("Name of C", HTMLInputElement);
    name.addEventListener("input", () => before.push(chosen.length));
    await type(name, "Moon");
    // A list tells of a choice twice, and what was chosen is taken from the second.
    const stock = control("Thickness of C", HTMLSelectElement);
    await act(async () => stock.dispatchEvent(new Event("input", { bubbles: true })));
    before.push(chosen.length);
    expect(before).toEqual([0, 1]);
    await act(async () => stock.dispatchEvent(new Event("change", { bubbles: true })));
    expect(chosen).toEqual([wholeC, wholeC]);
  });

  it("is chosen by its key alone, or with Shift beside what is chosen", async () => {
    const alone = await showRow();
    await press(button("Choose C, Layer C"));
    expect(alone).toEqual([wholeC]);
    const beside = await showRow();
    await act(async () => {
      button("Choose C, Layer C").dispatchEvent(new MouseEvent("click", { bubbles: true, shiftKey: true }));
    });
    expect(beside).toEqual([{ layerKey: "C", pieceIds: ["a", "c"], holeId: null }]);
  });
});
