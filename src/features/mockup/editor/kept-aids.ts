import { type DeskAids, deskAidsSchema } from "../model/desk-aids.ts";

const keyOf = (personId: string) => `standproud:desk-aids:${personId}`;

/** The browser's own store; null where it lets pages keep nothing. */
export function browserStorage(): Storage | null {
  try {
    return window.localStorage;
  } catch (error) {
    if (error instanceof DOMException) return null;
    throw error;
  }
}

/** What a person chose in this browser; null when nothing was, or it can't be read any more. */
export function findAids(storage: Storage | null, personId: string): DeskAids | null {
  const kept = deskAidsSchema.safeParse(parsed(storage?.getItem(keyOf(personId)) ?? "null"));
  return kept.success ? kept.data : null;
}

/** Keeps what was chosen. False when the browser has no room or does not let pages keep anything. */
export function keepAids(storage: Storage | null, personId: string, aids: DeskAids): boolean {
  try {
    storage?.setItem(keyOf(personId), JSON.stringify(aids));
    return storage !== null;
  } catch (error) {
    if (error instanceof DOMException) return false;
    throw error;
  }
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
