import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { AppError, wrongState } from "../http/app-error.ts";
import { type Outcome, type WorkerInTurn, workerInTurn } from "../threads/worker-in-turn.ts";
import type { DrawingAnswer, DrawingQuestion, FreezeInput, Frozen } from "./drawing-worker.ts";

/**
 * A large sign takes seconds to compute and to draw; in a thread of its own it keeps nobody else waiting, and it can be ended.
 * Somebody waits for a freeze with the job's row locked, so few may wait and none for long.
 */
export const drawingLimits = { freezeMs: 30_000, freezesWaiting: 3, proofMs: 120_000 } as const;

const program = { bundle: "drawing-worker.mjs", source: "../drawing/drawing-worker.ts", memoryMb: 1024 } as const;
// WebAssembly memory never shrinks, so a worker is replaced after this many drawings.
const questionsEach = 50;
const freezer: WorkerInTurn<DrawingQuestion, DrawingAnswer> = workerInTurn(program, { questionsEach });
const painter: WorkerInTurn<DrawingQuestion, DrawingAnswer> = workerInTurn(program, { questionsEach });

/**
 * What a revision freezes. Throws too_large when that takes too long, wrong_state for a piece out of all reach, and too_many_requests
 * while others are being worked out.
 */
export async function freezeDrawing(
  input: FreezeInput,
  { timeMs = drawingLimits.freezeMs }: { timeMs?: number } = {},
): Promise<Frozen> {
  if (freezer.waiting() >= drawingLimits.freezesWaiting) {
    throw new AppError("too_many_requests", {
      detail: "Other revisions are being issued right now. Try again in a minute; nothing is lost.",
    });
  }
  const told = await freezer.ask({ what: "freeze", input }, { timeMs });
  if (told.kind === "answer" && told.answer.what === "freeze") return told.answer.frozen;
  if (told.kind === "answer" && told.answer.what === "out of reach")
    throw wrongState("A piece reaches far beyond the board. Bring it back, or make it smaller, and issue it then.");
  if (told.kind === "late") {
    throw new AppError("too_large", {
      detail:
        "This mockup has more in it than can be drawn in half a minute. Take pieces off, or give them simpler outlines.",
    });
  }
  throw faultOf(told);
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
