import { useEffect, useRef, useState } from "react";
import { isSame } from "../model/same.ts";

type Numbered = { readonly sequence: number };

/** The ends of a worker that answers questions by their numbers; tests put the same work behind them without one. */
export type AskPort<Question, Said> = {
  readonly postMessage: (question: Numbered & Question) => void;
  readonly addEventListener: (type: "message", listener: (event: { data: Numbered & Said }) => void) => void;
  readonly terminate: () => void;
};

/** What a worker said to a question; null when it broke down over it. */
export type Answer<Question, Said> = { readonly of: Question; readonly said: (Numbered & Said) | null };

/**
 * Asks a worker, started at the first question, whenever the question is another one. Gives the newest answer, which may be to an
 * earlier question while the newest is being worked on, and the question that is asked now as the object that `of` refers to.
 * Answers to questions that were overtaken are dropped.
 */
export function useAsked<Question extends object, Said>(
  start: (onError: () => void) => AskPort<Question, Said>,
  asked: Question | null,
): { readonly question: Question | null; readonly answer: Answer<Question, Said> | null } {
  const [question, setQuestion] = useState(asked);
  if (!isSame(question, asked)) setQuestion(asked);
  const [answer, setAnswer] = useState<Answer<Question, Said> | null>(null);
  const port = useRef<AskPort<Question, Said> | null>(null);
  const newest = useRef<{ sequence: number; question: Question | null }>({ sequence: 0, question: null });

  useEffect(() => {
    if (question === null) return;
    if (port.current === null) {
      port.current = start(() => {
        const { question: of } = newest.current;
        if (of !== null) setAnswer({ of, said: null });
      });
      port.current.addEventListener("message", ({ data }) => {
        const { question: of, sequence } = newest.current;
        if (of !== null && data.sequence === sequence) setAnswer({ of, said: data });
      });
    }
    newest.current = { sequence: newest.current.sequence + 1, question };
    port.current.postMessage({ ...question, sequence: newest.current.sequence });
  }, [question, start]);

  useEffect(
    () => () => {
      port.current?.terminate();
      port.current = null;
    },
    [],
  );
  return { question, answer };
}
