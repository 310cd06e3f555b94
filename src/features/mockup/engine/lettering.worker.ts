import { layWords } from "#shared/lettering/lay-words.ts";
import { loadKernel } from "@/lib/load-kernel.ts";
import type { WordsAnswer, WordsQuestion } from "./lettering-messages.ts";
import { loadFace } from "./load-face.ts";

let newest = 0;

/** Words that are being written are set here, so that the page never waits for them. Those overtaken stay unanswered. */
addEventListener("message", (event: MessageEvent<WordsQuestion>) => {
  newest = event.data.sequence;
  void answer(event.data);
});

async function answer({ sequence, face: key, setting }: WordsQuestion): Promise<void> {
  const say = (message: WordsAnswer) => postMessage(message);
  try {
    const [kernel, { face, fontSha256 }] = await Promise.all([loadKernel(), loadFace(key)]);
    // What was asked meanwhile is heard before the work begins.
    await new Promise<void>((resolve) => setTimeout(resolve));
    if (newest !== sequence) return;
    say({ sequence, ok: true, outcome: layWords(setting, face, kernel), fontSha256 });
  } catch (error) {
    say({ sequence, ok: false, reason: error instanceof Error ? error.message : String(error) });
  }
}
