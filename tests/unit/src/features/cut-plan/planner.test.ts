import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { type PlanState, startPlanner } from "@/features/cut-plan/engine/planner.ts";
import { cutBars, laySheets, readWork } from "@/features/cut-plan/engine/run-task.ts";
import { buildLayer, disc, plate } from "../../../../support/build-sign.ts";
import { buildFrame, buildSlatSign } from "../../../../support/slat-sign.ts";
import { inputOf, silentPorts } from "./sites.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

/** Two sheet materials, slats and a frame. */
const sign = () =>
  buildSlatSign(
    {},
    [
      buildLayer("B", [plate("panel", 300, 200, [300, 200])]),
      buildLayer("C", [disc("moon", 40, [300, 200])], { thickness: 6 }),
    ],
    { frame: buildFrame() },
  );
const input = () => inputOf(sign());
const never = { quick: true, control: { isTimeUp: () => false } };

function start() {
  const ports = silentPorts();
  const states: PlanState[] = [];
  const planner = startPlanner(input(), ports.open, (state) => states.push(state));
  const now = () => {
    const state = states.at(-1);
    if (!state) throw new Error("Nothing was told.");
    return state;
  };
  const work = readWork(input(), kernel);
  const [first] = work.sheets;
  if (!first) throw new Error("Nothing is cut from sheets.");
  const laid = laySheets(first, never, kernel);
  if (!laid.ok) throw new Error(laid.words);
  return { planner, ports, now, work, laid, port: (index: number) => ports.opened[index] };
}

describe("a cut plan in the making", () => {
  it("asks for one task after the other, sheets first", () => {
    const { port, now, work, laid } = start();
    expect(port(0)?.asked.map(({ kind }) => kind)).toEqual(["read"]);
    port(0)?.say({ kind: "read", work });
    expect(now()).toMatchObject({
      step: "planning",
      sheets: [{ state: { step: "running" } }, { state: { step: "waiting" } }],
    });
    port(0)?.say({ kind: "sheets", outcome: laid });
    port(0)?.say({ kind: "sheets", outcome: { ok: false, words: "Too large." } });
    const [slats, frame] = work.bars;
    if (!slats || !frame) throw new Error("Nothing is cut from bars.");
    port(0)?.say({ kind: "bars", outcome: cutBars(slats, never) });
    expect(now().step).toBe("planning");
    port(0)?.say({ kind: "bars", outcome: cutBars(frame, never) });
    expect(now()).toMatchObject({
      step: "planned",
      sheets: [{ state: { outcome: { ok: true } } }, { state: { outcome: { ok: false, words: "Too large." } } }],
    });
    expect(port(0)?.asked.map((asked) => [asked.kind, "quick" in asked && asked.quick])).toEqual([
      ["read", false],
      ["sheets", false],
      ["sheets", false],
      ["bars", false],
      ["bars", false],
    ]);
  });

  it("keeps the best that was told when it is stopped, and lays out the rest quickly with another worker", () => {
    const { planner, port, now, work, laid } = start();
    port(0)?.say({ kind: "read", work });
    port(0)?.say({ kind: "progress", done: 0.25, best: laid.value });
    expect(now().sheets[0]?.state).toMatchObject({ step: "running", done: 0.25 });
    planner.stop();
    expect(port(0)?.isEnded).toBe(true);
    expect(now()).toMatchObject({
      isStopped: true,
      sheets: [{ state: { outcome: { ok: true, ended: "asked" } } }, {}],
    });
    expect(port(1)?.asked).toMatchObject([{ kind: "sheets", quick: true, task: { thicknessMm: 6 } }]);
    // What the ended worker still had to say is nothing to anybody.
    port(0)?.say({ kind: "broken", reason: "late" });
    expect(now().step).toBe("planning");
  });

  it("begins a task anew, quickly, when it is stopped before anything was told of it", () => {
    const { planner, port, work } = start();
    port(0)?.say({ kind: "read", work });
    planner.stop();
    expect(port(1)?.asked).toMatchObject([{ kind: "sheets", quick: true, task: { thicknessMm: 3 } }]);
    planner.stop();
    expect(port(2)).toBeUndefined();
  });

  it("says when the worker breaks down or does not start", () => {
    const broken = start();
    broken.port(0)?.say({ kind: "broken", reason: "out of memory" });
    expect(broken.now()).toMatchObject({ step: "failed", failure: "out of memory" });
    const dead = start();
    dead.port(0)?.breakDown();
    expect(dead.now()).toMatchObject({ step: "failed", failure: "The part of the page that plans did not start." });
  });
});

describe("one task", () => {
  it("comes out the same each time", () => {
    const { work } = start();
    for (const task of work.sheets) expect(laySheets(task, never, kernel)).toEqual(laySheets(task, never, kernel));
    for (const task of work.bars) expect(cutBars(task, never)).toEqual(cutBars(task, never));
  });

  it("ends by the clock with what was found by then", () => {
    const { work } = start();
    const [task] = work.sheets;
    if (!task) throw new Error("Nothing is cut from sheets.");
    const outcome = laySheets(task, { quick: false, control: { isTimeUp: () => true } }, kernel);
    expect(outcome).toMatchObject({ ok: true, ended: "by the clock" });
  });

  it("lays on sheets to be bought what the counted ones are too few for", () => {
    const [task] = start().work.sheets;
    if (!task) throw new Error("Nothing is cut from sheets.");
    const [usual] = task.request.stock;
    const [piece] = task.request.pieces;
    if (!usual || !piece) throw new Error("The task is empty.");
    const few = {
      ...task,
      sheetsAreCounted: true,
      // Four of 300 by 200 lie on a sheet of 1220 by 610 cut up for a bed of 900 by 600, and more; ten need a second one.
      request: { ...task.request, stock: [{ ...usual, quantity: 1 }], pieces: [{ ...piece, quantity: 16 }] },
    };
    const outcome = laySheets(few, never, kernel);
    if (!outcome.ok) throw new Error(outcome.words);
    const { layout, bought } = outcome.value;
    const copies = (of: typeof bought) =>
      (of?.sheets ?? []).reduce((sum, { placements }) => sum + placements.length, 0);
    expect(copies(layout)).toBeGreaterThan(3);
    expect(copies(bought)).toBeGreaterThan(0);
    expect(copies(layout) + copies(bought)).toBe(16);
  });
});
