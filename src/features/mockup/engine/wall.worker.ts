import { drawOnWall } from "#shared/drawing/on-wall.ts";
import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { loadKernel } from "@/lib/load-kernel.ts";
import type { WallAnswer, WallQuestion } from "./wall-messages.ts";

let newest = 0;

/** The sign is drawn for its wall here, so that the page never waits for it. Questions overtaken by another stay unanswered. */
addEventListener("message", (event: MessageEvent<WallQuestion>) => {
  newest = event.data.sequence;
  void answer(event.data);
});

async function answer({ sequence, document, unit }: WallQuestion): Promise<void> {
  const say = (message: WallAnswer) => postMessage(message);
  try {
    const kernel = rememberingKernel(await loadKernel());
    await new Promise<void>((resolve) => setTimeout(resolve));
    if (newest !== sequence) return;
    const figures = computeFigures(document, kernel);
    say({ sequence, ok: true, onWall: drawOnWall({ document, figures, kernel, unit }) });
  } catch (error) {
    say({ sequence, ok: false, reason: error instanceof Error ? error.message : String(error) });
  }
}
