import { createContext, useContext, useEffect, useRef, useState } from "react";
import { isSame } from "../model/same.ts";
import type { ShapeAnswer, ShapePort } from "./shape-messages.ts";
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
export function useShaped(asked: ShapeTask | null): Shaping {
  const start = useContext(ShapeWorkerContext);
  const [task, setTask] = useState(asked);
  if (!isSame(task, asked)) setTask(asked);
  const [answer, setAnswer] = useState<{ readonly of: ShapeTask; readonly made: ShapeMade | null } | null>(null);
  const port = useRef<ShapePort | null>(null);
  const question = useRef<{ sequence: number; task: ShapeTask | null }>({ sequence: 0, task: null });

  useEffect(() => {
    if (task === null) return;
    const hear = ({ sequence, ...said }: ShapeAnswer) => {
      const { task: of, sequence: newest } = question.current;
      if (of !== null && sequence === newest) setAnswer({ of, made: said.ok ? said.made : null });
    };
    if (port.current === null) {
      port.current = start(() => {
        const { task: of } = question.current;
        if (of !== null) setAnswer({ of, made: null });
      });
      port.current.addEventListener("message", ({ data }) => hear(data));
    }
    question.current = { sequence: question.current.sequence + 1, task };
    port.current.postMessage({ sequence: question.current.sequence, task });
  }, [task, start]);

  useEffect(
    () => () => {
      port.current?.terminate();
      port.current = null;
    },
    [],
  );

  if (task === null) return { step: "nothing", shown: null };
  const shown = answer?.made ?? null;
  if (answer?.of !== task) return { step: "working", shown };
  return { step: answer.made ? "made" : "failed", shown };
}
