import { type Copied, copiedToText } from "../model/copied.ts";

/** Where a copy is kept: for one person, and for the jobs of one client of one shop, so that no client's drawing comes to another. */
export type CopyPlace = { readonly personId: string; readonly shop: string; readonly clientId: string };

const keyOf = ({ personId, shop, clientId }: CopyPlace) => `standproud:copied:${personId}:${shop}:${clientId}`;
const listeners = new Set<() => void>();

/** Keeps a copy in place of the last one. False when the browser has no room or lets pages keep nothing. */
export function keepCopied(storage: Storage | null, place: CopyPlace, copied: Copied): boolean {
  try {
    storage?.setItem(keyOf(place), copiedToText(copied));
  } catch (error) {
    if (error instanceof DOMException) return false;
    throw error;
  }
  for (const listener of listeners) listener();
  return storage !== null;
}

/** The text of the copy; null when nothing was copied. Anything could have been written there. */
export function findCopiedText(storage: Storage | null, place: CopyPlace): string | null {
  return storage?.getItem(keyOf(place)) ?? null;
}

/** Calls back when something was copied, here or in another window. Gives back how to stop. */
export function listenToCopies(listener: () => void): () => void {
  listeners.add(listener);
  window.addEventListener("storage", listener);
  return () => {
    listeners.delete(listener);
    window.removeEventListener("storage", listener);
  };
}
