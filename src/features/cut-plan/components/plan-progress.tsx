import { Busy } from "@/components/ui/busy.tsx";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { counted } from "@/lib/format.ts";
import type { PlanState, TaskState } from "../engine/planner.ts";
import type { CutPlan } from "../engine/use-cut-plan.ts";
import { sheetCount, stateWords } from "../model/plan-words.ts";

/** How far the plan is, task by task, with the way to stop it. */
export function PlanProgress({ plan: { state, stop, planAgain } }: { readonly plan: CutPlan }) {
  if (state.step === "failed")
    return (
      <Notice tone="error" title="The plan could not be made.">
        <p>{state.failure} Nothing was lost: the mockup is as it was saved.</p>
        <Button size="small" className="mt-3 print:hidden" onClick={planAgain}>
          Plan it again
        </Button>
      </Notice>
    );
  const tasks = [
    ...state.sheets.map(({ task, state: at }) => ({
      task,
      at,
      words: stateWords(at, (laid) => counted(sheetCount(laid), "sheet")),
    })),
    ...state.bars.map(({ task, state: at }) => ({
      task,
      at,
      words: stateWords(at, ({ barCount }) => counted(barCount, "bar")),
    })),
  ];
  if (state.step === "planned") return null;
  const over = tasks.filter(({ at }) => at.step === "over").length;
  const running = tasks.find(({ at }) => at.step === "running");
  return (
    <div className="max-w-3xl border border-rule bg-sheet p-4 print:hidden">
      <Busy
        label={labelOf(state, running?.task.title)}
        {...(tasks.length > 0 ? { share: (over + shareOf(running?.at)) / tasks.length } : {})}
      />
      <ul className="mt-3 space-y-1 text-sm">
        {tasks.map(({ task, words }) => (
          <li key={task.id} className="flex flex-wrap justify-between gap-x-6">
            <span className="text-ink">{task.title}</span>
            <span className="text-graphite tabular-nums">{words}</span>
          </li>
        ))}
      </ul>
      {state.step === "planning" && !state.isStopped && (
        <Button size="small" className="mt-3" onClick={stop}>
          Stop and keep the best
        </Button>
      )}
    </div>
  );
}

function labelOf({ step, isStopped }: PlanState, running: string | undefined): string {
  if (step === "reading") return "Reading what is to be cut";
  if (running === undefined) return "Planning";
  return isStopped ? `Laying out the rest quickly: ${running}` : `Laying out ${running}`;
}

const shareOf = (state: TaskState<unknown> | undefined): number => (state?.step === "running" ? state.done : 0);
