import { loadKernel } from "@/lib/load-kernel.ts";
import { drawPicture } from "./draw-picture.ts";
import { createEngineMemory } from "./engine-memory.ts";
import { createGrainCache } from "./grain-cache.ts";
import type { PictureAnswer, PictureOutcome, PictureRequest } from "./picture-messages.ts";

const grain = createGrainCache();
const memory = createEngineMemory();

/** Figures and pictures are made here, so that the page never waits for them. */
addEventListener("message", (event: MessageEvent<PictureRequest>) => {
  void answer(event.data);
});

async function answer({ sequence, ...input }: PictureRequest): Promise<void> {
  const message: PictureAnswer = { sequence, outcome: await outcomeOf(input) };
  postMessage(message);
}

async function outcomeOf(input: Omit<PictureRequest, "sequence">): Promise<PictureOutcome> {
  try {
    const known = memory.take(input, await loadKernel());
    return { ok: true, picture: drawPicture(known.input, { kernel: known.kernel, grain }) };
  } catch (error) {
    // The page says it in words; the cause is only of use to us.
    return { ok: false, reason: error instanceof Error ? error.message : String(error) };
  }
}
