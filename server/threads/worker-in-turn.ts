import type { TransferListItem, Worker } from "node:worker_threads";
import type { WorkerMessage } from "./answer-questions.ts";
import { startWorker, type WorkerProgram } from "./start-worker.ts";

/** What became of a question: its answer, or why there is none. `late` and `fault` have ended the worker. */
export type Outcome<A> =
  | { readonly kind: "answer"; readonly answer: A }
  | { readonly kind: "late" }
  | { readonly kind: "fault"; readonly message: string };

export type WorkerInTurn<Q, A> = {
  /** Never rejects for what is in the question; rejects when no worker can be started. `timeMs` counts from its turn. */
  readonly ask: (
    question: Q,
    options: { timeMs: number; transfer?: readonly TransferListItem[] },
  ) => Promise<Outcome<A>>;
  /** How many were asked and are not answered yet. */
  readonly waiting: () => number;
  /** Ends the worker that waits for the next question, if there is one. */
  readonly stop: () => Promise<void>;
};

type Told<A> = WorkerMessage<A> | { readonly kind: "late" };

const startMs = 60_000;

/**
 * A worker thread that answers one question at a time and is ended when it takes too long, runs out of memory or breaks;
 * the next question gets a new one. It is kept between questions, up to `questionsEach`, and keeps no process alive.
 */
export function workerInTurn<Q, A>(
  program: WorkerProgram,
  { questionsEach }: { questionsEach: number },
): WorkerInTurn<Q, A> {
  let idle: { readonly worker: Worker; readonly questions: number } | undefined;
  let queue: Promise<unknown> = Promise.resolve();
  let waiting = 0;

  const forget = (worker: Worker): void => {
    if (idle?.worker === worker) idle = undefined;
  };

  /** A worker that has loaded its code, so that a question's time does not pay for the start. Rejects when it can't start. */
  async function startedWorker(): Promise<Worker> {
    const worker = startWorker(program);
    // An idle worker may still die; unheard, that would end the process.
    worker.on("error", () => forget(worker));
    worker.on("exit", () => forget(worker));
    const told = await nextMessage<A>(worker, startMs);
    if (told.kind === "ready") return worker;
    await worker.terminate();
    throw new Error(told.kind === "fault" ? told.message : `The worker ${program.bundle} did not start.`);
  }

  async function askNow(question: Q, timeMs: number, transfer: readonly TransferListItem[]): Promise<Outcome<A>> {
    const { worker, questions } = idle ?? { worker: await startedWorker(), questions: 0 };
    idle = undefined;
    worker.postMessage(question, transfer);
    const told = await nextMessage<A>(worker, timeMs);
    if (told.kind === "answer" && !told.spent && questions + 1 < questionsEach)
      idle = { worker, questions: questions + 1 };
    else await worker.terminate();
    if (told.kind === "answer") return { kind: "answer", answer: told.answer };
    return told.kind === "ready" ? { kind: "fault", message: "The worker started twice." } : told;
  }

  return {
    ask(question, { timeMs, transfer = [] }) {
      waiting += 1;
      const turn = queue.then(() => askNow(question, timeMs, transfer)).finally(() => (waiting -= 1));
      // A failed turn must not stop the ones behind it; its own caller hears of it.
      queue = turn.catch(() => undefined);
      return turn;
    },
    waiting: () => waiting,
    async stop() {
      await queue;
      const left = idle;
      idle = undefined;
      await left?.worker.terminate();
    },
  };
}

/** The worker's next message, its end, or the end of the time. Only while one is awaited does the worker keep the process alive. */
function nextMessage<A>(worker: Worker, timeMs: number): Promise<Told<A>> {
  return new Promise((resolve) => {
    const settle = (told: Told<A>) => {
      clearTimeout(timer);
      worker.off("message", settle).off("error", onError).off("exit", onExit);
      worker.unref();
      resolve(told);
    };
    const onError = (error: Error) => settle({ kind: "fault", message: error.message });
    const onExit = (code: number) => settle({ kind: "fault", message: `The worker ended with code ${code}.` });
    const timer = setTimeout(() => settle({ kind: "late" }), timeMs);
    worker.on("message", settle).on("error", onError).on("exit", onExit);
    worker.ref();
  });
}
