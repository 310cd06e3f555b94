import { parentPort } from "node:worker_threads";

/** What a worker says: that it has loaded, an answer, or what went wrong on our side. After a fault, or when spent, it must not be used again. */
export type WorkerMessage<A> =
  | { readonly kind: "ready" }
  | { readonly kind: "answer"; readonly answer: A; readonly spent: boolean }
  | { readonly kind: "fault"; readonly message: string };

/** Makes this worker thread answer one question after the other. Throws outside a worker. */
export function answerQuestions<Q, A>(
  answer: (question: Q) => Promise<A>,
  { isSpent = () => false }: { isSpent?: () => boolean } = {},
): void {
  const port = parentPort;
  if (!port) throw new Error("This program must be started as a worker thread.");
  const say = (message: WorkerMessage<A>): void => port.postMessage(message);
  port.on("message", (question: Q) => {
    answer(question).then(
      (given) => say({ kind: "answer", answer: given, spent: isSpent() }),
      (error: unknown) =>
        say({ kind: "fault", message: error instanceof Error ? (error.stack ?? error.message) : String(error) }),
    );
  });
  say({ kind: "ready" });
}
