// @vitest-environment jsdom
import { MemoryRouter } from "react-router-dom";
import { beforeAll, beforeEach, describe, expect, it, vi } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { calculations } from "#shared/calculations/definitions.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { CalculationSheet } from "@/features/calculations/components/calculation-sheet.tsx";
import type { ExamplesState } from "@/features/calculations/engine/use-worked-examples.ts";
import { workedExamples } from "@/features/calculations/engine/worked-examples.ts";
import { button, press, render } from "../../support/render.tsx";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});
beforeEach(() => {
  // jsdom lays nothing out, so it has nowhere to scroll to.
  Element.prototype.scrollIntoView = vi.fn();
});

const computed = (): ExamplesState => ({ step: "computed", examples: workedExamples(calculations, kernel) });
const draw = (state: ExamplesState, { at = "/", onComputeAgain = () => {} } = {}) =>
  render(
    <MemoryRouter initialEntries={[at]}>
      <CalculationSheet groups={calculations} state={state} onComputeAgain={onComputeAgain} />
    </MemoryRouter>,
  );
const entry = (id: string): HTMLElement => {
  const found = document.getElementById(id);
  if (!found) throw new Error(`no entry ${id}`);
  return found;
};
const rowsOf = (id: string) => [...entry(id).querySelectorAll("tr")].map((row) => row.textContent);

describe("the sheet of calculations", () => {
  it("shows each one with its rule, source, limits and a result of its own function", async () => {
    await draw(computed());
    for (const { id, title, formula, source, limits } of calculations.flatMap((group) => group.calculations)) {
      for (const text of [title, formula, source.text, limits]) expect(entry(id).textContent).toContain(text);
      const results = [...entry(id).querySelectorAll("tbody:last-of-type td:nth-child(2)")];
      expect(results.length, title).toBeGreaterThan(0);
      for (const { textContent } of results) expect(textContent, title).toMatch(/^(?!.*(NaN|Infinity|undefined)).+/);
    }
    // Stud 5, placing error 0.5, movement 0.25: 5 + 2 · 0.75.
    expect(rowsOf("hole-window")).toContain("From6.5mm");
    // ISO 7823-1: 3 mm is 2.3 to 3.7.
    expect(rowsOf("sheet-tolerance")).toContain("At the thinnest2.3mm");
  });

  it("marks and focuses the one that the address names", async () => {
    await draw(computed(), { at: "/#hole-window" });
    expect(document.activeElement).toBe(entry("hole-window"));
  });

  it("shows the rules while the examples are computed", async () => {
    await draw({ step: "computing" });
    expect(entry("mass").textContent).toContain("Area without pockets and holes");
    expect(document.querySelector("table")).toBeNull();
    expect(document.querySelector('[aria-busy="true"]')).not.toBeNull();
  });

  it("says when the examples could not be computed, once, and computes them again", async () => {
    const again = vi.fn();
    await draw({ step: "failed", reason: "No kernel." }, { onComputeAgain: again });
    expect(document.querySelectorAll('[role="alert"]')).toHaveLength(1);
    expect(document.querySelector('[role="alert"]')?.textContent).toContain("No kernel.");
    await press(button("Compute them again"));
    expect(again).toHaveBeenCalledOnce();
  });
});

describe("workedExamples", () => {
  it("keeps the others when one throws", () => {
    const broken = {
      id: "broken",
      title: "Broken",
      formula: "None",
      source: { text: "None", status: "our choice" },
      limits: "None",
      example: () => {
        throw new Error("No result.");
      },
    } as const;
    const examples = workedExamples([{ title: "All", calculations: [broken] }, ...calculations], kernel);
    expect(examples.broken).toEqual({ ok: false, reason: "No result." });
    expect(Object.values(examples).filter(({ ok }) => !ok)).toHaveLength(1);
  });
});
