import { createContext, useContext, useEffect, useRef, useState } from "react";
import { isSame } from "../model/same.ts";
import type { BoardAnswer, BoardPort } from "./board-messages.ts";
import type { BareSign, LaidBoard } from "./lay-board.ts";

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
  const start = useContext(BoardWorkerContext);
  const [sign, setSign] = useState(asked);
  if (!isSame(sign, asked)) setSign(asked);
  const [answer, setAnswer] = useState<{ readonly of: BareSign; readonly laid: LaidBoard | null } | null>(null);
  const port = useRef<BoardPort | null>(null);
  const question = useRef<{ sequence: number; sign: BareSign | null }>({ sequence: 0, sign: null });

  useEffect(() => {
    if (sign === null) return;
    const hear = ({ sequence, ...said }: BoardAnswer) => {
      const { sign: of, sequence: newest } = question.current;
      if (of !== null && sequence === newest) setAnswer({ of, laid: said.ok ? said.laid : null });
    };
    if (port.current === null) {
      port.current = start(() => {
        const { sign: of } = question.current;
        if (of !== null) setAnswer({ of, laid: null });
      });
      port.current.addEventListener("message", ({ data }) => hear(data));
    }
    question.current = { sequence: question.current.sequence + 1, sign };
    port.current.postMessage({ sequence: question.current.sequence, sign });
  }, [sign, start]);

  useEffect(
    () => () => {
      port.current?.terminate();
      port.current = null;
    },
    [],
  );

  const shown = sign === null ? null : (answer?.laid ?? null);
  if (sign === null) return { state: { step: "nothing" }, shown };
  if (answer?.of !== sign) return { state: { step: "laying" }, shown };
  return { state: answer.laid ? { step: "laid", laid: answer.laid } : { step: "failed" }, shown };
}
