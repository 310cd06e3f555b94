import { createContext, useContext } from "react";
import type { LaidWords } from "#shared/lettering/lay-words.ts";
import type { WordsAsked, WordsPort } from "./lettering-messages.ts";
import { useAsked } from "./use-asked.ts";

export type LaidWordsState =
  | { readonly step: "nothing" | "laying" }
  | { readonly step: "laid"; readonly laid: LaidWords; readonly fontSha256: string }
  /** They can't be laid so, in a sentence, or something broke down. */
  | { readonly step: "refused" | "failed"; readonly problem: string };

const startWorker = (onError: () => void): WordsPort => {
  const worker = new Worker(new URL("./lettering.worker.ts", import.meta.url), { type: "module", name: "lettering" });
  worker.addEventListener("error", onError);
  return worker;
};

/** Who sets words. A worker, unless somebody above says otherwise. */
export const LetteringWorkerContext = createContext<(onError: () => void) => WordsPort>(startWorker);

const brokenDown = "The words could not be set: the setter stopped. Try again.";

/** Words as they are laid, worked out beside the page. While newer ones are being set the last are still given by `shown`. */
export function useLaidWords(asked: WordsAsked | null): {
  readonly state: LaidWordsState;
  readonly shown: LaidWords | null;
} {
  const { question, answer } = useAsked(useContext(LetteringWorkerContext), asked);
  if (question === null) return { state: { step: "nothing" }, shown: null };
  const said = answer?.said ?? null;
  const shown = said?.ok && said.outcome.ok ? said.outcome.laid : null;
  if (answer?.of !== question) return { state: { step: "laying" }, shown };
  if (said === null) return { state: { step: "failed", problem: brokenDown }, shown };
  if (!said.ok) return { state: { step: "failed", problem: said.reason }, shown };
  const { outcome, fontSha256 } = said;
  return {
    state: outcome.ok
      ? { step: "laid", laid: outcome.laid, fontSha256 }
      : { step: "refused", problem: outcome.problem },
    shown,
  };
}
