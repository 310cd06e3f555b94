// @vitest-environment jsdom
import { describe, expect, it } from "vitest";
import { CellLength, CellText } from "@/features/mockup/panels/cell-controls.tsx";
import { render, type, until } from "../../support/render.tsx";

const cell = (): HTMLInputElement => {
  const input = document.querySelector("input");
  if (!input) throw new Error("no cell is drawn");
  return input;
};
const said = () => document.querySelector('[role="alert"]')?.textContent ?? null;

describe("a cell of the desk's tables", () => {
  it.each([
    { text: "abc", words: "Write a length, like 19 or 2.5 cm." },
    { text: "", words: "Write a length, like 19 or 2.5 cm." },
    { text: "-5", words: "From 0 mm to 1000 mm." },
    { text: "20000", words: "From 0 mm to 1000 mm." },
  ])('says why "$text" is no offset, and goes back to what is drawn', async ({ text, words }) => {
    const taken: number[] = [];
    await render(
      <CellLength
        aria-label="Offset of B"
        mm={19}
        unit="mm"
        bounds={{ least: 0, most: 1000 }}
        onCommit={(mm) => taken.push(mm)}
      />,
    );
    await type(cell(), text);
    await until(() => said() === words);
    expect(cell().value).toBe("19");
    expect(taken).toEqual([]);
  });

  it("takes a length in the shop's unit without a word", async () => {
    const taken: number[] = [];
    await render(
      <CellLength
        aria-label="Offset of B"
        mm={19}
        unit="in"
        bounds={{ least: 0, most: 1000 }}
        onCommit={(mm) => taken.push(mm)}
      />,
    );
    await type(cell(), "1/2");
    expect(taken).toEqual([12.7]);
    expect(said()).toBeNull();
  });

  it("stops saying it once something else is typed", async () => {
    await render(
      <CellText
        aria-label="Name of B"
        value="Disc"
        onCommit={(text) => (text.trim() === "" ? "Give the layer a name." : null)}
      />,
    );
    await type(cell(), "  ");
    await until(() => said() === "Give the layer a name.");
    await type(cell(), "Night disc");
    await until(() => said() === null);
  });
});
