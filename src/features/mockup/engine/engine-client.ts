import type { MendsOutcome, PictureAnswer, PictureInput, PictureRequest, PictureResult } from "./picture-messages.ts";

/** The two ends of a worker that the client needs, so that tests can put another engine behind it. */
export type WorkerPort = {
  readonly postMessage: (request: PictureRequest) => void;
  readonly addEventListener: (type: "message", listener: (event: { data: PictureAnswer }) => void) => void;
  readonly terminate: () => void;
};

export type Engine = {
  /** Asks for the picture of a document. Only the newest question waits; those it overtakes are dropped unanswered. */
  readonly ask: (input: PictureInput) => void;
  readonly close: () => void;
};

/**
 * One question at a time goes to the worker and the newest one waits, so that a drag never piles up work. Answers come in
 * the order of their questions, each with the input that it is for.
 */
export function createEngine(
  port: WorkerPort,
  onResult: (result: PictureResult) => void,
  onMends: (result: { readonly input: PictureInput; readonly mends: MendsOutcome }) => void,
): Engine {
  let sequence = 0;
  let answered: { sequence: number; input: PictureInput } | null = null;
  let asked: { sequence: number; input: PictureInput } | null = null;
  let waiting: PictureInput | null = null;
  let closed = false;

  function send(input: PictureInput) {
    sequence += 1;
    asked = { sequence, input };
    port.postMessage({ sequence, ...input });
  }

  port.addEventListener("message", ({ data }) => {
    if (closed) return;
    if ("mends" in data) {
      // What mends an older picture is of no use any more.
      if (answered?.sequence === data.sequence) onMends({ input: answered.input, mends: data.mends });
      return;
    }
    if (data.sequence !== asked?.sequence) return;
    answered = asked;
    const { input } = asked;
    asked = null;
    if (waiting !== null) {
      const next = waiting;
      waiting = null;
      send(next);
    }
    onResult({ input, outcome: data.outcome });
  });

  return {
    ask: (input) => {
      if (asked === null) send(input);
      else waiting = input;
    },
    close: () => {
      closed = true;
      port.terminate();
    },
  };
}
