import { useEffect, useEffectEvent, useReducer, useRef, useState } from "react";
import type { Mockup } from "#shared/contracts/mockups.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { hasUnsavedWork, nextAutosave, saveDueAt, startAutosave } from "../model/autosave.ts";
import { type DraftPlace, dropDraft, keepDraft } from "./kept-draft.ts";
import { saveDraft } from "./save-mockup.ts";

/** Where the work stands with the server, and what can be done about it. */
export type Saving = ReturnType<typeof useAutosave>;

type Options = {
  readonly mockup: Mockup;
  readonly document: MockupDocument;
  readonly place: DraftPlace;
  /** Called with what the server holds after each save. */
  readonly onSaved: (mockup: Mockup) => void;
};

/**
 * Saves the document as it changes. What the server does not have is kept in this browser while it can't be reached, and
 * when the page is closed; `keptHere` is false when the browser had no room for that.
 */
export function useAutosave({ mockup, document, place, onSaved }: Options) {
  const [autosave, dispatch] = useReducer(nextAutosave, mockup, startAutosave);
  const [keptHere, setKeptHere] = useState(true);
  /** The document that the server has, by reference. */
  const onServer = useRef(mockup.document);
  /** The document that is on the desk, also for a request that is answered after it was left. */
  const onDesk = useRef(mockup.document);
  const isLeft = useRef(false);
  const waiters = useRef<((version: number | null) => void)[]>([]);
  const unsaved = hasUnsavedWork(autosave) || document !== onServer.current;

  const keep = useEffectEvent(() => {
    const draft = { version: autosave.version, keptAt: new Date().toISOString(), document };
    return keepDraft(window.localStorage, place, draft);
  });

  /** What was changed while the last save was on its way, after the desk was left. */
  async function sendTheRest(version: number) {
    const rest = onDesk.current;
    keepDraft(window.localStorage, place, { version, keptAt: new Date().toISOString(), document: rest });
    const outcome = await saveDraft(place, { version, document: rest });
    if (outcome.kind !== "saved") return;
    onSaved({ ...outcome.mockup, document: rest });
    dropDraft(window.localStorage, place);
  }

  const send = useEffectEvent(async () => {
    if (autosave.state === "saving" || autosave.state === "stale") return;
    const sent = document;
    dispatch({ kind: "sent" });
    const outcome = await saveDraft(place, { version: autosave.version, document: sent });
    if (outcome.kind === "saved") {
      onServer.current = sent;
      onSaved({ ...outcome.mockup, document: sent });
      dispatch({ kind: "answered", version: outcome.mockup.version, savedAt: outcome.mockup.savedAt });
      if (!isLeft.current || onDesk.current === sent) dropDraft(window.localStorage, place);
      else await sendTheRest(outcome.mockup.version);
    } else if (outcome.kind === "newer") dispatch(outcome);
    else if (outcome.kind === "refused") dispatch(outcome);
    else dispatch({ kind: "unreachable", now: Date.now() });
  });

  const noteEdit = useEffectEvent((now: MockupDocument) => {
    onDesk.current = now;
    // What is on its way is soon the server's, so that going back to what it had is an edit, too.
    if (now !== onServer.current || autosave.state === "saving") dispatch({ kind: "edited", now: Date.now() });
  });
  useEffect(() => noteEdit(document), [document]);

  const due = saveDueAt(autosave);
  useEffect(() => {
    if (due === null) return;
    const timer = setTimeout(() => void send(), Math.max(0, due - Date.now()));
    return () => clearTimeout(timer);
  }, [due]);

  const { state, version } = autosave;
  useEffect(() => {
    if (state === "saved") settle(waiters.current, version);
    if (state === "stale" || state === "refused" || state === "offline") {
      settle(waiters.current, null);
      setKeptHere(keep());
    }
  }, [state, version]);

  const sendWhenBack = useEffectEvent(() => {
    if (autosave.state === "offline") void send();
  });
  useEffect(() => {
    const tryAgain = () => sendWhenBack();
    window.addEventListener("online", tryAgain);
    return () => window.removeEventListener("online", tryAgain);
  }, []);

  const leave = useEffectEvent((event: BeforeUnloadEvent) => {
    if (!unsaved) return;
    keep();
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
    if (isSent || autosave.state === "stale") return;
    keep();
    void send();
  });
  useEffect(() => {
    isLeft.current = false;
    return () => sendOnTheWayOut();
  }, []);

  return {
    autosave,
    unsaved,
    keptHere,
    /** Saves now and gives the version on the server, or null when that could not be done. */
    saveNow: (): Promise<number | null> =>
      new Promise((resolve) => {
        if (autosave.state === "saved" && autosave.version > 0 && document === onServer.current) {
          resolve(autosave.version);
          return;
        }
        waiters.current.push(resolve);
        void send();
      }),
    keepMine: () => dispatch({ kind: "keep mine", now: Date.now() }),
    /** The caller puts the newer document on the desk; from here on it is the one the server has. */
    keepTheirs: () => {
      if (autosave.state !== "stale") return;
      onServer.current = autosave.newer.document;
      dropDraft(window.localStorage, place);
      dispatch({ kind: "keep theirs" });
    },
  };
}

function settle(waiters: ((version: number | null) => void)[], version: number | null): void {
  for (const resolve of waiters.splice(0)) resolve(version);
}
