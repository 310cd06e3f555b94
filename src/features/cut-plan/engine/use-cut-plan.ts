import { useCallback, useEffect, useRef, useState } from "react";
import type { PlanInput } from "./plan-messages.ts";
import { nothingPlanned, type Planner, type PlanPort, type PlanState, startPlanner } from "./planner.ts";

const openWorker = (): PlanPort =>
  new Worker(new URL("./plan.worker.ts", import.meta.url), { type: "module", name: "plan" });

export type CutPlan = {
  readonly state: PlanState;
  readonly stop: () => void;
  readonly planAgain: () => void;
};

/** The cut plan of `input`, made anew when that changes, and kept while the page is open. Give it an input that stays the same. */
export function useCutPlan(input: PlanInput, openPort: () => PlanPort = openWorker): CutPlan {
  const [state, setState] = useState<PlanState>(nothingPlanned);
  const planner = useRef<Planner | null>(null);

  const planAgain = useCallback(() => {
    planner.current?.close();
    planner.current = startPlanner(input, openPort, setState);
  }, [input, openPort]);
  useEffect(() => {
    planAgain();
    return () => planner.current?.close();
  }, [planAgain]);

  return { state, stop: useCallback(() => planner.current?.stop(), []), planAgain };
}
