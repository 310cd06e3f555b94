import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import { loadKernel } from "@/lib/load-kernel.ts";
import type { BoardAnswer, BoardQuestion } from "./board-messages.ts";
import { layBoard } from "./lay-board.ts";

let newest = 0;

/** Boards that are being written are laid here, so that the page never waits for them. Those overtaken stay unanswered. */
addEventListener("message", (event: MessageEvent<BoardQuestion>) => {
  newest = event.data.sequence;
  void answer(event.data);
});

async function answer({ sequence, sign }: BoardQuestion): Promise<void> {
  const say = (message: BoardAnswer) => postMessage(message);
  try {
    const kernel = await loadKernel();
    // What was asked meanwhile is heard before the work begins.
    await new Promise<void>((resolve) => setTimeout(resolve));
    if (newest !== sequence) return;
    say({ sequence, ok: true, laid: layBoard(sign, rememberingKernel(kernel)) });
  } catch (error) {
    say({ sequence, ok: false, reason: error instanceof Error ? error.message : String(error) });
  }
}
