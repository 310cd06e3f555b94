import { useState } from "react";

/** What lies in the tab's own store, or null. A browser that refuses the store only loses the draft's survival of a reload. */
function readStored(key: string): unknown {
  try {
    const text = window.sessionStorage.getItem(key);
    return text === null ? null : (JSON.parse(text) as unknown);
  } catch {
    return null;
  }
}

/** Whether it could be stored; null takes the entry out. */
function writeStored(key: string, value: unknown): boolean {
  try {
    if (value === null) window.sessionStorage.removeItem(key);
    else window.sessionStorage.setItem(key, JSON.stringify(value));
    return true;
  } catch {
    return false;
  }
}

/**
 * What is being typed, kept in this tab so that a reload does not lose it. `read` takes what was stored and gives null for
 * anything that isn't a draft; null as a value means that there is none.
 */
export function useSessionDraft<T>(
  key: string,
  read: (stored: unknown) => T | null,
): readonly [T | null, (draft: T | null) => void] {
  const [held, setHeld] = useState(() => ({ key, draft: read(readStored(key)) }));
  // Another key is another draft: the old one stays stored under its own.
  const current = held.key === key ? held : { key, draft: read(readStored(key)) };
  if (current !== held) setHeld(current);

  function change(draft: T | null) {
    writeStored(key, draft);
    setHeld({ key, draft });
  }
  return [current.draft, change];
}

/** A draft that is one text; an empty one is none. */
export function useSessionText(key: string): readonly [string, (text: string) => void] {
  const [draft, setDraft] = useSessionDraft(key, (stored) => (typeof stored === "string" ? stored : null));
  return [draft ?? "", (text) => setDraft(text === "" ? null : text)];
}

/** Whether a text that was being typed lies there from before, as after a reload. */
export const hasSessionText = (key: string): boolean => typeof readStored(key) === "string";
