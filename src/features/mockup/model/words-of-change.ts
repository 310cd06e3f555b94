import type { History } from "./history.ts";

/** What was done between two states of a desk, in words that are said aloud; null when its document is the same. */
export function wordsOfChange(before: History, after: History): string | null {
  if (before.present === after.present) return null;
  const undone = before.past.at(-1);
  if (undone && after.present === undone.document && after.past.length === before.past.length - 1)
    return `Undone: ${undone.label}`;
  const [redone] = before.future;
  if (redone && after.present === redone.document && after.past.length === before.past.length + 1)
    return `Done again: ${redone.label}`;
  return after.past.at(-1)?.label ?? "Back at the start";
}
