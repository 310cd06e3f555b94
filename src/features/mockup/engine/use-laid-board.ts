import { createContext, useContext } from "react";
import type { BoardPort } from "./board-messages.ts";
import type { BareSign, LaidBoard } from "./lay-board.ts";
import { useAsked } from "./use-asked.ts";

export type LaidState =
  | { readonly step: "nothing" | "laying" }
  | { readonly step: "laid"; readonly laid: LaidBoard }
  | { readonly step: "failed" };

const startWorker = (onError: () => void): BoardPort => {
  const worker = new Worker(new URL("./board.worker.ts", import.meta.url), { type: "module", name: "board" });
  worker.addEventListener("error", onError);
  return worker;
};

/** Who lays boards. A worker, unless somebody above says otherwise. */
export const BoardWorkerContext = createContext<(onError: () => void) => BoardPort>(startWorker);

/**
 * A board as its slats and frame lie, worked out beside the page once there is one. While a newer one is being laid the
 * last is still given by `shown`; `state` is of the very board asked about.
 */
export function useLaidBoard(asked: BareSign | null): {
  readonly state: LaidState;
  readonly shown: LaidBoard | null;
} {
  const { question, answer } = useAsked(useContext(BoardWorkerContext), asked && { sign: asked });
  if (question === null) return { state: { step: "nothing" }, shown: null };
  const laid = answer?.said?.ok ? answer.said.laid : null;
  if (answer?.of !== question) return { state: { step: "laying" }, shown: laid };
  return { state: laid ? { step: "laid", laid } : { step: "failed" }, shown: laid };
}
