import { usualSaws } from "#shared/cut-plan/shop-saws.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { standardStock } from "#shared/materials/standard-stock.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { PlanAnswer, PlanInput, PlanRequest } from "@/features/cut-plan/engine/plan-messages.ts";
import type { PlanPort } from "@/features/cut-plan/engine/planner.ts";
import { cutBars, laySheets, readWork } from "@/features/cut-plan/engine/run-task.ts";

export const inputOf = (document: MockupDocument): PlanInput => ({
  document,
  stock: standardStock,
  limits: defaultLimits,
  saws: usualSaws,
  unit: "mm",
});

/** A worker whose answers the test gives. */
export function silentPorts() {
  const opened: { asked: PlanRequest[]; say: (answer: PlanAnswer) => void; breakDown: () => void; isEnded: boolean }[] =
    [];
  const open = (): PlanPort => {
    const hearers: ((event: { data: PlanAnswer }) => void)[] = [];
    const mourners: (() => void)[] = [];
    const port = {
      asked: [] as PlanRequest[],
      isEnded: false,
      say: (data: PlanAnswer) => {
        for (const hear of hearers) hear({ data });
      },
      breakDown: () => {
        for (const mourn of mourners) mourn();
      },
    };
    opened.push(port);
    return {
      postMessage: (request) => void port.asked.push(request),
      addEventListener: (
        ...[type, listener]: ["message", (event: { data: PlanAnswer }) => void] | ["error", () => void]
      ) => {
        if (type === "message") hearers.push(listener);
        else mourners.push(listener);
      },
      terminate: () => {
        port.isEnded = true;
      },
    };
  };
  return { open, opened };
}

/** A worker that does the work at once and answers after the turn, quickly always. */
export function workingPort(kernel: Kernel): () => PlanPort {
  return () => {
    const { open, opened } = silentPorts();
    const port = open();
    const control = { isTimeUp: () => false };
    const answer = (request: PlanRequest): PlanAnswer => {
      switch (request.kind) {
        case "read":
          return { kind: "read", work: readWork(request.input, kernel) };
        case "sheets":
          return { kind: "sheets", outcome: laySheets(request.task, { quick: true, control }, kernel) };
        case "bars":
          return { kind: "bars", outcome: cutBars(request.task, { quick: true, control }) };
      }
    };
    return {
      ...port,
      postMessage: (request) => void Promise.resolve().then(() => opened[0]?.say(answer(request))),
    };
  };
}
