import type { Mockup } from "#shared/contracts/mockups.ts";

/** Quiet time after an edit before it is saved, and how long edits may go on unsaved. Both ms. */
export const quietMs = 800;
export const longestUnsavedMs = 2000;
/** How long to wait before trying again while the server can't be reached, ms. */
export const retryMs = 5000;

type Base = { readonly version: number; readonly savedAt: string | null };

/** `version` is the one on the server that the work began from. Times are ms on the caller's clock. */
export type Autosave =
  | (Base & { readonly state: "saved" })
  | (Base & { readonly state: "dirty"; readonly since: number; readonly lastEdit: number })
  | (Base & { readonly state: "saving"; readonly editedAt: number | null })
  | (Base & { readonly state: "stale"; readonly newer: Mockup })
  | (Base & { readonly state: "offline"; readonly failedAt: number })
  | (Base & { readonly state: "refused"; readonly why: string });

export type AutosaveEvent =
  | { readonly kind: "edited"; readonly now: number }
  | { readonly kind: "sent" }
  | { readonly kind: "answered"; readonly version: number; readonly savedAt: string | null }
  | { readonly kind: "newer"; readonly newer: Mockup }
  | { readonly kind: "unreachable"; readonly now: number }
  | { readonly kind: "refused"; readonly why: string }
  | { readonly kind: "keep mine"; readonly now: number }
  | { readonly kind: "keep theirs" };

export function startAutosave({ version, savedAt }: Base): Autosave {
  return { state: "saved", version, savedAt };
}

/** The next state. Events that have no meaning in a state, as an answer that nobody waits for, change nothing. */
export function nextAutosave(autosave: Autosave, event: AutosaveEvent): Autosave {
  const { version, savedAt } = autosave;
  switch (event.kind) {
    case "edited":
      if (autosave.state === "saving") return { ...autosave, editedAt: autosave.editedAt ?? event.now };
      if (autosave.state === "dirty") return { ...autosave, lastEdit: event.now };
      // Offline the retry is already waiting, and a stale draft first needs a choice.
      if (autosave.state === "offline" || autosave.state === "stale") return autosave;
      return { state: "dirty", version, savedAt, since: event.now, lastEdit: event.now };
    case "sent":
      return autosave.state === "stale" || autosave.state === "saving"
        ? autosave
        : { state: "saving", version, savedAt, editedAt: null };
    case "answered":
      if (autosave.state !== "saving") return autosave;
      return settled(autosave, { version: event.version, savedAt: event.savedAt });
    case "newer":
      return autosave.state === "saving" ? { state: "stale", version, savedAt, newer: event.newer } : autosave;
    case "unreachable":
      return autosave.state === "saving" ? { state: "offline", version, savedAt, failedAt: event.now } : autosave;
    case "refused":
      return autosave.state === "saving" ? { state: "refused", version, savedAt, why: event.why } : autosave;
    case "keep mine":
      if (autosave.state !== "stale") return autosave;
      // Saving over the newer version: from here on it is the one that the work begins from.
      return {
        state: "dirty",
        version: autosave.newer.version,
        savedAt,
        since: event.now - longestUnsavedMs,
        lastEdit: event.now,
      };
    case "keep theirs":
      if (autosave.state !== "stale") return autosave;
      return { state: "saved", version: autosave.newer.version, savedAt: autosave.newer.savedAt };
  }
}

/** When the next save is to be sent, on the caller's clock; null when nothing waits for one. */
export function saveDueAt(autosave: Autosave): number | null {
  if (autosave.state === "dirty") return Math.min(autosave.lastEdit + quietMs, autosave.since + longestUnsavedMs);
  if (autosave.state === "offline") return autosave.failedAt + retryMs;
  return null;
}

/** Whether closing the page now would lose work that the server does not have. */
export function hasUnsavedWork(autosave: Autosave): boolean {
  return autosave.state !== "saved";
}

function settled(autosave: Extract<Autosave, { state: "saving" }>, saved: Base): Autosave {
  if (autosave.editedAt === null) return { state: "saved", ...saved };
  return { state: "dirty", ...saved, since: autosave.editedAt, lastEdit: autosave.editedAt };
}
