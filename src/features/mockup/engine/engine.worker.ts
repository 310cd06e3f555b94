import { loadKernel } from "@/lib/load-kernel.ts";
import { drawPicture } from "./draw-picture.ts";
import { createEngineMemory } from "./engine-memory.ts";
import { createGrainCache } from "./grain-cache.ts";
import { mendFindings } from "./mend-findings.ts";
import type { Mends, PictureAnswer, PictureRequest } from "./picture-messages.ts";

const grain = createGrainCache();
const memory = createEngineMemory();

let newest = 0;

/** Figures and pictures are made here, so that the page never waits for them. */
addEventListener("message", (event: MessageEvent<PictureRequest>) => {
  newest = event.data.sequence;
  void answer(event.data);
});

async function answer({ sequence, ...asked }: PictureRequest): Promise<void> {
  const say = (message: PictureAnswer) => postMessage(message);
  let drawn: (() => Promise<Mends | null>) | null = null;
  try {
    const { input, kernel } = memory.take(asked, await loadKernel());
    const picture = drawPicture(input, { kernel, grain });
    say({ sequence, outcome: { ok: true, picture } });
    drawn = () => mendFindings(input, picture, { kernel, isOvertaken: () => newest !== sequence, pause });
  } catch (error) {
    say({ sequence, outcome: { ok: false, reason: reasonOf(error) } });
  }
  try {
    const list = await drawn?.();
    if (list && list.length > 0) say({ sequence, mends: { ok: true, list } });
  } catch (error) {
    say({ sequence, mends: { ok: false, reason: reasonOf(error) } });
  }
}

/** The page says it in words; the cause is only of use to us. */
const reasonOf = (error: unknown): string => (error instanceof Error ? error.message : String(error));

const pause = () => new Promise<void>((resolve) => setTimeout(resolve));
