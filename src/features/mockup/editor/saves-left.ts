import { useSyncExternalStore } from "react";

/** Of which mockup, whoever works on it. */
type SavedPlace = { readonly shop: string; readonly jobId: string };

const keyOf = ({ shop, jobId }: SavedPlace) => `${shop} ${jobId}`;

/** How many saves of a mockup a desk has left behind that nobody has answered yet. */
const left = new Map<string, number>();
const listeners = new Set<() => void>();

/** Notes a save that is still on its way while its desk is left. It is over when `done` is settled, well or not. */
export function leaveSave(place: SavedPlace, done: Promise<void>): void {
  count(keyOf(place), 1);
  void done.finally(() => count(keyOf(place), -1));
}

/**
 * Whether a desk of this page that was left is still saving this mockup. A new desk waits for it: what it began from would
 * be the version before, and its own first save a conflict with the one that it came from.
 */
export function useIsSaveLeft(place: SavedPlace): boolean {
  return useSyncExternalStore(subscribe, () => left.has(keyOf(place)));
}

function count(key: string, by: 1 | -1): void {
  const now = (left.get(key) ?? 0) + by;
  if (now > 0) left.set(key, now);
  else left.delete(key);
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
