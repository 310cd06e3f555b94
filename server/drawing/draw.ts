import type { Finding } from "#shared/dry-fit/finding.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { AppError, wrongState } from "../http/app-error.ts";
import { shopLine } from "../threads/shop-line.ts";
import { type Outcome, type WorkerInTurn, workerInTurn } from "../threads/worker-in-turn.ts";
import type { CheckInput, DrawingAnswer, DrawingQuestion, FreezeInput, Frozen } from "./drawing-worker.ts";

/**
 * A large sign takes seconds to compute and to draw; in a thread of its own it keeps nobody else waiting, and it can be ended.
 * Somebody waits for a freeze with the job's row locked, so few may wait and none for long, and no shop fills the line alone.
 */
export const drawingLimits = { freezeMs: 30_000, freezesWaiting: 3, freezesOfAShop: 2, proofMs: 120_000 } as const;

const program = { bundle: "drawing-worker.mjs", source: "../drawing/drawing-worker.ts", memoryMb: 1024 } as const;
// WebAssembly memory never shrinks, so a worker is replaced after this many drawings.
const questionsEach = 50;
const freezer: WorkerInTurn<DrawingQuestion, DrawingAnswer> = workerInTurn(program, { questionsEach });
const painter: WorkerInTurn<DrawingQuestion, DrawingAnswer> = workerInTurn(program, { questionsEach });

/** `shopId` is the shop that asks. */
type AskOptions = { readonly timeMs?: number; readonly shopId?: string };

/** Who waits for the freezer. */
const line = shopLine();

/**
 * What a revision freezes. Throws too_large when that takes too long, wrong_state for a piece out of all reach, and too_many_requests
 * while others are being worked out.
 */
export async function freezeDrawing(input: FreezeInput, options: AskOptions = {}): Promise<Frozen> {
  const answer = await askFreezer({ what: "freeze", input }, options);
  if (answer.what !== "freeze") throw new Error(`Asked to freeze, the drawing worker answered ${answer.what}.`);
  return answer.frozen;
}

/** What the dry fit finds. Throws as freezeDrawing does: it waits in the same line. */
export async function checkDrawing(input: CheckInput, options: AskOptions = {}): Promise<readonly Finding[]> {
  const answer = await askFreezer({ what: "check", input }, options);
  if (answer.what !== "check") throw new Error(`Asked for a dry fit, the drawing worker answered ${answer.what}.`);
  return answer.findings;
}

async function askFreezer(
  question: DrawingQuestion,
  { timeMs = drawingLimits.freezeMs, shopId = "" }: AskOptions,
): Promise<DrawingAnswer> {
  const ofShop = shopId === "" ? 0 : line.of(shopId);
  if (freezer.waiting() >= drawingLimits.freezesWaiting || ofShop >= drawingLimits.freezesOfAShop) {
    throw new AppError("too_many_requests", {
      detail: "Other mockups are being worked out right now. Try again in a minute; nothing is lost.",
    });
  }
  const told = await line.stand(shopId, () => freezer.ask(question, { timeMs }));
  if (told.kind === "late") {
    throw new AppError("too_large", {
      detail:
        "This mockup has more in it than can be drawn in half a minute. Take pieces off, or give them simpler outlines.",
    });
  }
  if (told.kind !== "answer") throw faultOf(told);
  if (told.answer.what === "out of reach")
    throw wrongState("A piece reaches far beyond the board. Bring it back, or make it smaller, and try again then.");
  return told.answer;
}

/** The proof's PDF, drawn from the frozen snapshot. Throws when it can't be drawn. */
export async function drawProof(snapshot: Snapshot, sha256: string): Promise<Uint8Array> {
  const told = await painter.ask({ what: "proof", snapshot, sha256 }, { timeMs: drawingLimits.proofMs });
  if (told.kind === "answer" && told.answer.what === "proof") return told.answer.pdf;
  throw faultOf(told);
}

/** Ends the workers that wait for the next drawing. */
export async function stopDrawing(): Promise<void> {
  await Promise.all([freezer.stop(), painter.stop()]);
}

function faultOf(told: Outcome<DrawingAnswer>): Error {
  if (told.kind === "fault") return new Error(`The drawing broke: ${told.message}`);
  return new Error(told.kind === "late" ? "The drawing took too long." : "The drawing worker answered something else.");
}
