import type { BarTask } from "#shared/cut-plan/bar-tasks.ts";
import type { SheetTask } from "#shared/cut-plan/sheet-tasks.ts";
import type { WoodPlan } from "#shared/cut-plan/wood-plan.ts";
import type { CuttingPlan } from "#shared/stock-lengths/plan-cutting.ts";
import type { PlanAnswer, PlanInput, PlanRequest, SheetsLaid, TaskOutcome } from "./plan-messages.ts";

/** The two ends of a worker that the planner needs, so that tests can put another engine behind it. */
export type PlanPort = {
  readonly postMessage: (request: PlanRequest) => void;
  readonly addEventListener: {
    (type: "message", listener: (event: { data: PlanAnswer }) => void): void;
    (type: "error", listener: () => void): void;
  };
  readonly terminate: () => void;
};

/** Where a task stands. `done` of a running one is a share. */
export type TaskState<T> =
  | { readonly step: "waiting" }
  | { readonly step: "running"; readonly done: number; readonly best: T | null }
  | { readonly step: "over"; readonly outcome: TaskOutcome<T> };

export type SheetWork = { readonly task: SheetTask; readonly state: TaskState<SheetsLaid> };
export type BarWork = { readonly task: BarTask; readonly state: TaskState<CuttingPlan> };

export type PlanState = {
  readonly step: "reading" | "planning" | "planned" | "failed";
  /** Why it failed. */
  readonly failure: string | null;
  /** Whether somebody asked for the end: what was not begun was then laid out quickly. */
  readonly isStopped: boolean;
  readonly wood: WoodPlan | null;
  readonly sheets: readonly SheetWork[];
  readonly bars: readonly BarWork[];
};

export const nothingPlanned: PlanState = {
  step: "reading",
  failure: null,
  isStopped: false,
  wood: null,
  sheets: [],
  bars: [],
};

export type Planner = {
  /** Keeps the best layout of the search at hand; what is still to come is laid out quickly. */
  readonly stop: () => void;
  readonly close: () => void;
};

/**
 * Has the tasks of a document done one after the other, sheets first. A worker that searches hears nothing, so stopping
 * ends it and goes on with another.
 */
export function startPlanner(input: PlanInput, openPort: () => PlanPort, onState: (state: PlanState) => void): Planner {
  let state = nothingPlanned;
  let port = open();
  let isClosed = false;

  function open(): PlanPort {
    const opened = openPort();
    opened.addEventListener("message", ({ data }) => {
      if (opened === port && !isClosed) take(data);
    });
    opened.addEventListener("error", () => {
      if (opened === port && !isClosed) fail("The part of the page that plans did not start.");
    });
    return opened;
  }

  function set(changes: Partial<PlanState>) {
    state = { ...state, ...changes };
    onState(state);
  }

  const fail = (failure: string) => set({ step: "failed", failure });

  function take(answer: PlanAnswer) {
    switch (answer.kind) {
      case "read": {
        const { sheets, bars, wood } = answer.work;
        const waiting = { step: "waiting" } as const;
        set({
          step: "planning",
          wood,
          sheets: sheets.map((task) => ({ task, state: waiting })),
          bars: bars.map((task) => ({ task, state: waiting })),
        });
        return next();
      }
      case "progress":
        return setSheets({ step: "running", done: answer.done, best: answer.best });
      case "sheets":
        setSheets({ step: "over", outcome: answer.outcome });
        return next();
      case "bars":
        setBars({ step: "over", outcome: answer.outcome });
        return next();
      case "broken":
        return fail(answer.reason);
    }
  }

  /** Puts a state in the place of the task that runs. */
  const setSheets = (to: TaskState<SheetsLaid>) => set({ sheets: withRunning(state.sheets, to) });
  const setBars = (to: TaskState<CuttingPlan>) => set({ bars: withRunning(state.bars, to) });

  function next() {
    const quick = state.isStopped;
    const sheets = state.sheets.find(isWaiting);
    const bars = state.bars.find(isWaiting);
    if (sheets) {
      set({ sheets: withBegun(state.sheets, sheets) });
      port.postMessage({ kind: "sheets", task: sheets.task, quick });
    } else if (bars) {
      set({ bars: withBegun(state.bars, bars) });
      port.postMessage({ kind: "bars", task: bars.task, quick });
    } else set({ step: "planned" });
  }

  port.postMessage({ kind: "read", input });
  onState(state);
  return {
    stop: () => {
      if (state.step !== "planning" || state.isStopped) return;
      port.terminate();
      port = open();
      set({
        isStopped: true,
        sheets: state.sheets.map((work) => ({ ...work, state: stopped(work.state) })),
        bars: state.bars.map((work) => ({ ...work, state: stopped(work.state) })),
      });
      next();
    },
    close: () => {
      isClosed = true;
      port.terminate();
    },
  };
}

const isWaiting = ({ state }: { readonly state: TaskState<unknown> }): boolean => state.step === "waiting";

type Worked<T> = { readonly state: TaskState<T> };

function withRunning<T, W extends Worked<T>>(all: readonly W[], state: TaskState<T>): W[] {
  return all.map((work) => (work.state.step === "running" ? { ...work, state } : work));
}

function withBegun<W extends Worked<unknown>>(all: readonly W[], begun: W): W[] {
  return all.map((work) => (work === begun ? { ...work, state: { step: "running", done: 0, best: null } } : work));
}

/** What was told so far is kept; a task without anything is laid out anew, quickly. */
function stopped<T>(state: TaskState<T>): TaskState<T> {
  if (state.step !== "running") return state;
  return state.best === null
    ? { step: "waiting" }
    : { step: "over", outcome: { ok: true, value: state.best, ended: "asked" } };
}
