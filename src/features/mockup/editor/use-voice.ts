import { useCallback, useEffect, useEffectEvent, useRef, useState } from "react";
import type { History } from "../model/history.ts";
import { wordsOfChange } from "../model/words-of-change.ts";

/** What was last said, counted up each time something was, so that the same words said again are heard again. */
export type Said = { readonly words: string; readonly turn: number };

/** Says what was done, undone and done again, and what a tool has to say. `placeOf` tells where what taps moved lies now. */
export function useVoice(history: History, placeOf: () => string | null) {
  const [said, setSaid] = useState<Said>({ words: "", turn: 0 });
  const say = useCallback((words: string) => setSaid(({ turn }) => ({ words, turn: turn + 1 })), []);
  const before = useRef(history);
  const place = useEffectEvent(placeOf);
  useEffect(() => {
    const words = wordsOfChange(before.current, history);
    before.current = history;
    if (words === null) return;
    const where = history.together === null ? null : place();
    say(where === null ? words : `${words}, ${where}`);
  }, [history, say]);
  return { said, say };
}
