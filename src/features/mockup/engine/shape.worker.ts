import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import { loadKernel } from "@/lib/load-kernel.ts";
import type { ShapeAnswer, ShapeQuestion } from "./shape-messages.ts";
import { workShape } from "./work-shape.ts";

let newest = 0;

/** Pieces are shaped here, so that the page never waits for them. Questions overtaken by another stay unanswered. */
addEventListener("message", (event: MessageEvent<ShapeQuestion>) => {
  newest = event.data.sequence;
  void answer(event.data);
});

async function answer({ sequence, task }: ShapeQuestion): Promise<void> {
  const say = (message: ShapeAnswer) => postMessage(message);
  try {
    const kernel = await loadKernel();
    // What was asked meanwhile is heard before the work begins.
    await new Promise<void>((resolve) => setTimeout(resolve));
    if (newest !== sequence) return;
    say({ sequence, ok: true, made: workShape(task, rememberingKernel(kernel)) });
  } catch (error) {
    say({ sequence, ok: false, reason: error instanceof Error ? error.message : String(error) });
  }
}
