import { useEffect, useEffectEvent, useReducer, useRef } from "react";
import type { Mockup } from "#shared/contracts/mockups.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { hasUnsavedWork, nextAutosave, saveDueAt, startAutosave } from "../model/autosave.ts";
import { holdDesk } from "./desk-locks.ts";
import type { DraftKeeper } from "./draft-keeper.ts";
import type { DraftPlace } from "./draft-shelf.ts";
import { saveDraft } from "./save-mockup.ts";
import { leaveSave } from "./saves-left.ts";

/** Where the work stands with the server, and what can be done about it. */
export type Saving = ReturnType<typeof useAutosave>;

type Options = {
  readonly mockup: Mockup;
  /** The document that the desk was opened with: the mockup's, as the very object that is on the desk. */
  readonly start: MockupDocument;
  readonly document: MockupDocument;
  readonly place: DraftPlace;
  /** What was done last, in words; null when nothing was. */
  readonly lastChange: string | null;
  /** Keeps in this browser what the server does not have yet. The same one as long as the desk is open. */
  readonly keeper: DraftKeeper;
  /** Called with what the server holds after each save, and with the newer version that a save on the way out came upon. */
  readonly onSaved: (mockup: Mockup) => void;
};

/**
 * Saves the document as it changes. Until the server has it, it is kept in this browser: whether the server answers or not,
 * the tab is closed or dies, what was drawn more than a moment before is found again.
 */
export function useAutosave({ mockup, start, document, place, lastChange, keeper, onSaved }: Options) {
  const [autosave, dispatch] = useReducer(nextAutosave, mockup, startAutosave);
  /** The document that the server has, by reference. */
  const onServer = useRef(start);
  /** The document that is on the desk, also for a request that is answered after it was left. */
  const onDesk = useRef(start);
  const isLeft = useRef(false);
  /** The save that is on its way, until everything that comes of its answer is done. */
  const onItsWay = useRef<Promise<void> | null>(null);
  /** How many changes the server does not have. */
  const changes = useRef(0);
  const unlock = useRef(() => {});
  const waiters = useRef<((version: number | null) => void)[]>([]);
  const unsaved = hasUnsavedWork(autosave) || document !== onServer.current;

  const work = useEffectEvent(() => ({
    version: autosave.version,
    changes: changes.current,
    lastChange,
    document,
  }));

  /** What was changed while the last save was on its way, after the desk was left. */
  async function sendTheRest(version: number) {
    const rest = onDesk.current;
    await keeper.keepNow({ version, changes: changes.current, lastChange, document: rest });
    const outcome = await saveDraft(place, { version, document: rest });
    if (outcome.kind === "newer") onSaved(outcome.newer);
    if (outcome.kind !== "saved") return;
    onSaved({ ...outcome.mockup, document: rest });
    await keeper.letGo();
  }

  const send = useEffectEvent(() => {
    if (autosave.state === "saving" || autosave.state === "stale") return;
    const sending = sendNow();
    onItsWay.current = sending;
    void sending.finally(() => {
      if (onItsWay.current === sending) onItsWay.current = null;
    });
  });

  const sendNow = useEffectEvent(async () => {
    const sent = document;
    const sentChanges = changes.current;
    dispatch({ kind: "sent" });
    const outcome = await saveDraft(place, { version: autosave.version, document: sent });
    if (outcome.kind === "saved") {
      const { version, savedAt } = outcome.mockup;
      onServer.current = sent;
      changes.current -= sentChanges;
      onSaved({ ...outcome.mockup, document: sent });
      dispatch({ kind: "answered", version, savedAt });
      if (onDesk.current === sent) await keeper.letGo();
      else if (isLeft.current) await sendTheRest(version);
    } else if (outcome.kind === "newer") {
      dispatch(outcome);
      // A desk that is opened again begins from there, and offers what this one kept.
      if (isLeft.current) onSaved(outcome.newer);
    } else if (outcome.kind === "refused") dispatch(outcome);
    else dispatch({ kind: "unreachable", now: Date.now() });
    if (isLeft.current) unlock.current();
  });

  const noteEdit = useEffectEvent((now: MockupDocument) => {
    onDesk.current = now;
    // What is on its way is soon the server's, so that going back to what it had is an edit, too.
    const isAsOnServer = now === onServer.current && autosave.state !== "saving";
    if (isAsOnServer && autosave.state === "saved") return;
    if (!isAsOnServer) {
      changes.current += 1;
      dispatch({ kind: "edited", now: Date.now() });
    }
    keeper.keepSoon(work());
  });
  useEffect(() => noteEdit(document), [document]);

  const due = saveDueAt(autosave);
  useEffect(() => {
    if (due === null) return;
    const timer = setTimeout(() => send(), Math.max(0, due - Date.now()));
    return () => clearTimeout(timer);
  }, [due]);

  const { state, version } = autosave;
  useEffect(() => {
    if (state === "saved") settle(waiters.current, version);
    if (state === "stale" || state === "refused" || state === "offline") settle(waiters.current, null);
  }, [state, version]);

  const sendWhenBack = useEffectEvent(() => {
    if (autosave.state === "offline") send();
  });
  useEffect(() => {
    const tryAgain = () => sendWhenBack();
    window.addEventListener("online", tryAgain);
    return () => window.removeEventListener("online", tryAgain);
  }, []);

  /** A tab that is hidden may be taken away without another word. */
  const keepUnsaved = useEffectEvent(() => {
    if (unsaved) void keeper.keepNow(work());
  });
  useEffect(() => {
    const listen = () => keepUnsaved();
    window.addEventListener("pagehide", listen);
    window.document.addEventListener("visibilitychange", listen);
    return () => {
      window.removeEventListener("pagehide", listen);
      window.document.removeEventListener("visibilitychange", listen);
    };
  }, []);

  const leave = useEffectEvent((event: BeforeUnloadEvent) => {
    if (!unsaved) return;
    void keeper.keepNow(work());
    event.preventDefault();
  });
  useEffect(() => {
    const listen = (event: BeforeUnloadEvent) => leave(event);
    window.addEventListener("beforeunload", listen);
    return () => window.removeEventListener("beforeunload", listen);
  }, []);

  // Leaving for another page of the application does not stop a request, so the last edits are sent on the way out.
  const sendOnTheWayOut = useEffectEvent(() => {
    isLeft.current = true;
    const isSent = document === onServer.current && autosave.state !== "saving";
    if (!isSent) void keeper.keepNow(work());
    // Until an answer came the work is still on its way, and nobody is to be offered it.
    if (isSent || autosave.state === "stale") unlock.current();
    else send();
    if (onItsWay.current !== null) leaveSave(place, onItsWay.current);
  });
  const { deskId } = keeper;
  useEffect(() => {
    isLeft.current = false;
    unlock.current = holdDesk(deskId);
    return () => sendOnTheWayOut();
  }, [deskId]);

  return {
    autosave,
    unsaved,
    /** Saves now and gives the version on the server, or null when that could not be done. */
    saveNow: (): Promise<number | null> =>
      new Promise((resolve) => {
        if (autosave.state === "saved" && autosave.version > 0 && document === onServer.current) {
          resolve(autosave.version);
          return;
        }
        waiters.current.push(resolve);
        send();
      }),
    keepMine: () => dispatch({ kind: "keep mine", now: Date.now() }),
    /** The caller puts the newer document on the desk; from here on it is the one the server has. */
    keepTheirs: () => {
      if (autosave.state !== "stale") return;
      onServer.current = autosave.newer.document;
      changes.current = 0;
      void keeper.letGo();
      dispatch({ kind: "keep theirs" });
    },
  };
}

function settle(waiters: ((version: number | null) => void)[], version: number | null): void {
  for (const resolve of waiters.splice(0)) resolve(version);
}
