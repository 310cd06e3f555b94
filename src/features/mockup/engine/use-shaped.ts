import { createContext, useContext } from "react";
import type { ShapePort } from "./shape-messages.ts";
import { useAsked } from "./use-asked.ts";
import type { ShapeMade, ShapeTask } from "./work-shape.ts";

export type Shaping = {
  /** Of the last task that was worked out; null until one was. */
  readonly shown: ShapeMade | null;
  /** Whether `shown` is of the task asked for; "failed" when that could not be worked out. */
  readonly step: "nothing" | "working" | "made" | "failed";
};

const startWorker = (onError: () => void): ShapePort => {
  const worker = new Worker(new URL("./shape.worker.ts", import.meta.url), { type: "module", name: "shape" });
  worker.addEventListener("error", onError);
  return worker;
};

/** Who shapes pieces. A worker, unless somebody above says otherwise. */
export const ShapeWorkerContext = createContext<(onError: () => void) => ShapePort>(startWorker);

/** What a task makes of pieces, worked out beside the page. While a newer one is worked out the last is still shown. */
export function useShaped(task: ShapeTask | null): Shaping {
  const { question, answer } = useAsked(useContext(ShapeWorkerContext), task === null ? null : { task });
  if (question === null) return { step: "nothing", shown: null };
  const said = answer?.said ?? null;
  const shown = said?.ok ? said.made : null;
  if (answer?.of !== question) return { step: "working", shown };
  return { step: shown === null ? "failed" : "made", shown };
}
