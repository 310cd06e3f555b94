import type { BarTask } from "#shared/cut-plan/bar-tasks.ts";
import { barTasks } from "#shared/cut-plan/bar-tasks.ts";
import { type SheetTask, sheetTasks } from "#shared/cut-plan/sheet-tasks.ts";
import { woodPlan } from "#shared/cut-plan/wood-plan.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import type { SheetLayout } from "#shared/sheets/nesting.ts";
import { type CuttingPlan, planCutting } from "#shared/stock-lengths/plan-cutting.ts";
import type { Ended, PlanInput, SheetsLaid, TaskOutcome, Work } from "./plan-messages.ts";

/** What a task asks of those around it: the clock stands outside what is computed. */
export type TaskControl = {
  readonly isTimeUp: () => boolean;
  readonly onProgress?: (done: number, best: () => SheetsLaid) => void;
};

export function readWork(input: PlanInput, kernel: Kernel): Work {
  return { sheets: sheetTasks(input), bars: barTasks({ ...input, kernel }), wood: woodPlan({ ...input, kernel }) };
}

/** Pieces on the sheets in stock, and what these are too few for on sheets to be bought. */
export function laySheets(
  { request, usualSheet, sheetsAreCounted }: SheetTask,
  { quick, control }: { readonly quick: boolean; readonly control: TaskControl },
  kernel: Kernel,
): TaskOutcome<SheetsLaid> {
  const { isTimeUp, onProgress } = control;
  const effort = quick ? 0 : request.effort;
  const laid = nestSheets(
    { ...request, effort },
    {
      shouldStop: isTimeUp,
      ...(onProgress
        ? { onProgress: ({ done, layout }) => onProgress(done, () => ({ layout: layout(), bought: null })) }
        : {}),
    },
    kernel,
  );
  if (!laid.ok) return { ok: false, words: wordsOf(laid.problems) };
  const layout = laid.value;
  const bought = sheetsAreCounted ? onBoughtSheets(layout) : null;
  return { ok: true, value: { layout, bought }, ended: endedBy(layout.stopped || bought?.stopped === true) };

  function onBoughtSheets({ unplaced }: SheetLayout): SheetLayout | null {
    const left = new Map(
      unplaced.flatMap(({ pieceId, copies, reason }) =>
        reason === "no sheet left" || reason === "larger than every sheet" ? [[pieceId, copies] as const] : [],
      ),
    );
    if (left.size === 0) return null;
    const pieces = request.pieces.flatMap((piece) => {
      const quantity = left.get(piece.id);
      return quantity === undefined ? [] : [{ ...piece, quantity }];
    });
    const more = nestSheets({ ...request, pieces, stock: [usualSheet], effort }, { shouldStop: isTimeUp }, kernel);
    return more.ok && more.value.sheets.some(({ placements }) => placements.length > 0) ? more.value : null;
  }
}

/** Bars for one wood and section. */
export function cutBars(
  { job }: BarTask,
  { quick, control }: { readonly quick: boolean; readonly control: TaskControl },
): TaskOutcome<CuttingPlan> {
  const plan = planCutting(job, { shouldStop: control.isTimeUp, ...(quick ? { work: quickWork } : {}) });
  if (!plan.ok) return { ok: false, words: wordsOf(plan.problems) };
  return { ok: true, value: plan.value, ended: endedBy(plan.value.ended === "asked") };
}

/** Steps that a first good plan of bars takes: a fraction of a second. */
const quickWork = 200_000;

const endedBy = (isStopped: boolean): Ended => (isStopped ? "by the clock" : "searched");

const wordsOf = (problems: readonly { readonly words: string }[]): string =>
  [...new Set(problems.map(({ words }) => words))].join(" ");
