// @vitest-environment jsdom
import { act } from "react";
import { MemoryRouter } from "react-router-dom";
import { beforeAll, beforeEach, describe, expect, it, vi } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { CutPlanSheet } from "@/features/cut-plan/components/cut-plan-sheet.tsx";
import type { PlanPort } from "@/features/cut-plan/engine/planner.ts";
import { readWork } from "@/features/cut-plan/engine/run-task.ts";
import { buildLayer, disc, plate } from "../../../../support/build-sign.ts";
import { buildFrame, buildSlatSign } from "../../../../support/slat-sign.ts";
import { button, press, render, until } from "../../support/render.tsx";
import { inputOf, silentPorts, workingPort } from "./sites.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

/** jsdom lays nothing out: a window of 900 px is claimed. */
class NoSizes implements ResizeObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
}
beforeEach(() => {
  globalThis.ResizeObserver ??= NoSizes;
  vi.spyOn(HTMLElement.prototype, "clientWidth", "get").mockReturnValue(900);
  vi.spyOn(HTMLElement.prototype, "clientHeight", "get").mockReturnValue(600);
});

const sign = (slats = {}, rest: Partial<MockupDocument> = {}) =>
  buildSlatSign(
    slats,
    [
      buildLayer("B", [plate("panel", 300, 200, [300, 200], { name: "Panel" })]),
      buildLayer("C", [disc("moon", 40, [300, 200], { name: "Moon" })], { thickness: 6 }),
    ],
    { frame: buildFrame(), quantity: 2, ...rest },
  );

const page = () => document.body.textContent ?? "";
const openWith = (of: MockupDocument, openPort: () => PlanPort) => {
  const input = inputOf(of);
  return render(
    <MemoryRouter>
      <CutPlanSheet input={input} items={[]} openPort={openPort} />
    </MemoryRouter>,
  );
};
const plannedOf = async (of: MockupDocument) => {
  await openWith(of, workingPort(kernel));
  await until(() => document.querySelector('[aria-busy="false"]'));
};
const rowsOf = (caption: string) => {
  const table = [...document.querySelectorAll("table")].find((one) => one.caption?.textContent === caption);
  return [...(table?.tBodies[0]?.rows ?? [])].map((row) => [...row.cells].map((cell) => cell.textContent));
};

describe("a cut plan", () => {
  it("shows every piece on its sheet, the bars, and what to buy", async () => {
    await plannedOf(sign());
    for (const id of ["panel", "moon"]) expect(document.querySelectorAll(`[data-id="piece:${id}"]`)).toHaveLength(2);
    expect(page()).toContain("Midnight, 3 mm");
    expect(page()).toMatch(/20 parts from \d+ bars? of 2440 mm\. Proved: no fewer bars will do\./);
    expect(rowsOf("What to buy")).toContainEqual(["Midnight, 3 mm, sheet 1220 × 610 mm", "1", "0", "1"]);
    expect(rowsOf("What to buy")).toContainEqual([
      "Backer: Eastern white pine, 12 mm, 600 × 400 mm",
      "2",
      "not counted",
      "2, less what is there",
    ]);
  });

  it("lists slats in laying order, the frame's pieces and its diagonals", async () => {
    await plannedOf(sign());
    const slats = rowsOf("Slats in the order they are laid");
    // Ten of 40 mm over 400 mm; square, as long as the board is wide, and trimmed nowhere.
    expect(slats.map(([order]) => order)).toEqual(["1", "2", "3", "4", "5", "6", "7", "8", "9", "10"]);
    expect(slats[0]?.slice(1, 4)).toEqual(["whole", "600", "600"]);
    expect(rowsOf("Pieces of the frame")[0]).toEqual(["F1", "640", "600", "45°", "45°"]);
    // √(640² + 440²)
    expect(page()).toContain("776.7 mm both ways.");
  });

  it("says which piece goes on no sheet, and why", async () => {
    const huge = sign({}, { layers: [buildLayer("B", [plate("huge", 3000, 2000, [0, 0], { name: "Huge plate" })])] });
    await plannedOf(huge);
    expect(page()).toContain("Not every piece has a place");
    expect(page()).toMatch(/Huge plate: .*3000 × 2000 mm/);
  });

  it("says why slats can't be laid, and plans the rest", async () => {
    await plannedOf(sign({ slatWidth: 5000 }));
    expect(page()).toContain("A slat of 5000 mm is wider than the board");
    expect(document.querySelectorAll('[data-id="piece:moon"]')).toHaveLength(2);
  });

  it("is read out as busy, and lays out quickly what was not begun once it is stopped", async () => {
    const { open, opened } = silentPorts();
    await openWith(sign(), open);
    const work = readWork(inputOf(sign()), kernel);
    await act(async () => opened.at(-1)?.say({ kind: "read", work }));
    await until(() => page().includes("Laying out Midnight, 3 mm"));
    expect(document.querySelector('[aria-busy="true"]')).not.toBeNull();
    await press(button("Stop and keep the best"));
    expect(opened.at(-1)?.asked).toMatchObject([{ kind: "sheets", quick: true }]);
    expect(page()).toContain("Laying out the rest quickly: Midnight, 3 mm");
  });

  it("says that planning failed and plans again", async () => {
    const { open, opened } = silentPorts();
    await openWith(sign(), open);
    await act(async () => opened.at(-1)?.say({ kind: "broken", reason: "The kernel did not load." }));
    await until(() => page().includes("The plan could not be made."));
    const before = opened.length;
    await press(button("Plan it again"));
    expect(opened).toHaveLength(before + 1);
    expect(page()).not.toContain("The plan could not be made.");
  });
});
