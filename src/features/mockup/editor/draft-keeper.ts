import type { DraftPlace, DraftShelf, KeepOutcome, KeptDraft } from "./draft-shelf.ts";

/** How long hands are to rest before work is kept here, and how long it may go on unkept, ms: sooner than it is saved. */
const quietMs = 300;
const longestUnkeptMs = 1200;

export type Work = Pick<KeptDraft, "version" | "changes" | "lastChange" | "document">;

export type DraftKeeper = ReturnType<typeof draftKeeper>;

/**
 * Keeps one desk's work in this browser as it changes, whether or not the server answers, and lets go of it once the server
 * has it. `onOutcome` hears of each try.
 */
export function draftKeeper({
  shelf,
  place,
  deskId,
  onOutcome,
}: {
  readonly shelf: DraftShelf;
  readonly place: DraftPlace;
  readonly deskId: string;
  readonly onOutcome: (outcome: KeepOutcome) => void;
}) {
  let waiting: { work: Work; since: number; timer: ReturnType<typeof setTimeout> } | null = null;
  let isOnShelf = false;

  function stopWaiting() {
    if (waiting !== null) clearTimeout(waiting.timer);
    waiting = null;
  }

  async function keepNow(work: Work): Promise<void> {
    stopWaiting();
    isOnShelf = true;
    onOutcome(await shelf.put(place, { ...work, deskId, keptAt: new Date().toISOString() }));
  }

  return {
    deskId,
    keepNow,
    /** Keeps it in a moment, with whatever comes until then. */
    keepSoon(work: Work): void {
      const since = waiting?.since ?? Date.now();
      stopWaiting();
      const due = Math.max(0, Math.min(quietMs, since + longestUnkeptMs - Date.now()));
      waiting = { work, since, timer: setTimeout(() => void keepNow(work), due) };
    },
    /** The server has it all. */
    async letGo(): Promise<void> {
      stopWaiting();
      if (!isOnShelf) return;
      isOnShelf = false;
      await shelf.remove(place, deskId);
    },
  };
}
