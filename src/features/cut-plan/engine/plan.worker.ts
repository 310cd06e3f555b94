import { loadKernel } from "@/lib/load-kernel.ts";
import type { PlanAnswer, PlanRequest } from "./plan-messages.ts";
import { cutBars, laySheets, readWork, type TaskControl } from "./run-task.ts";

/** Nobody waits longer for one material. */
const mostMs = 20_000;
/** Between two layouts that are told: one costs a little to finish. */
const betweenToldMs = 800;

/** Layouts are searched here, so that the page never waits; it ends the worker to stop a search. */
addEventListener("message", (event: MessageEvent<PlanRequest>) => {
  void answer(event.data).then(tell);
});

const tell = (message: PlanAnswer): void => postMessage(message);

async function answer(request: PlanRequest): Promise<PlanAnswer> {
  try {
    const kernel = await loadKernel();
    switch (request.kind) {
      case "read":
        return { kind: "read", work: readWork(request.input, kernel) };
      case "sheets":
        return { kind: "sheets", outcome: laySheets(request.task, { quick: request.quick, control: clock() }, kernel) };
      case "bars":
        return { kind: "bars", outcome: cutBars(request.task, { quick: request.quick, control: clock() }) };
    }
  } catch (error) {
    return { kind: "broken", reason: error instanceof Error ? error.message : String(error) };
  }
}

function clock(): TaskControl {
  const start = performance.now();
  let toldAt = start;
  return {
    isTimeUp: () => performance.now() - start > mostMs,
    onProgress: (done, best) => {
      const now = performance.now();
      if (now - toldAt < betweenToldMs) return;
      tell({ kind: "progress", done, best: best() });
      toldAt = performance.now();
    },
  };
}
