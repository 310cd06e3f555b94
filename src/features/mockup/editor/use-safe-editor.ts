import { useEffect, useEffectEvent, useReducer, useState } from "react";
import type { Mockup } from "#shared/contracts/mockups.ts";
import { nextEditor, resumeEditor } from "../model/editor.ts";
import { browserShelf } from "./browser-shelf.ts";
import type { DraftPlace, KeptDraft } from "./draft-shelf.ts";
import { leaveHistory, resumeHistory } from "./session-history.ts";
import { useAutosave } from "./use-autosave.ts";
import { useDraftKeeper } from "./use-draft-keeper.ts";
import { useKeptDrafts } from "./use-kept-drafts.ts";

/** One for every desk of this page. */
const shelf = browserShelf();

type Options = {
  readonly mockup: Mockup;
  /** The same one as long as the desk is open. */
  readonly place: DraftPlace;
  readonly onSaved: (mockup: Mockup) => void;
};

/**
 * The editor with its safety net: the steps of the session, saving, the copy in this browser, and the choice between two
 * versions. Whatever replaces the document is a step that can be undone.
 */
export function useSafeEditor({ mockup, place, onSaved }: Options) {
  const [begun] = useState(() => resumeHistory(place, mockup.document));
  const [editor, dispatch] = useReducer(nextEditor, begun, resumeEditor);
  const document = editor.history.present;
  const { keeper, failure: keepFailure } = useDraftKeeper(shelf, place);
  const lastChange = editor.history.past.at(-1)?.label ?? null;
  const saving = useAutosave({ mockup, start: begun.present, document, place, lastChange, keeper, onSaved });
  const kept = useKeptDrafts({ shelf, place, onServer: mockup.document });

  const leave = useEffectEvent(() => leaveHistory(place, editor.history));
  useEffect(() => () => leave(), []);

  function keepTheirs() {
    if (saving.autosave.state !== "stale") return;
    const theirs = saving.autosave.newer.document;
    saving.keepTheirs();
    dispatch({ kind: "edit", label: "Keep the newer version", change: () => theirs });
  }

  /** Theirs becomes a step, too, so that undo still leads to what is saved over. */
  function keepMine() {
    if (saving.autosave.state !== "stale") return;
    const theirs = saving.autosave.newer.document;
    dispatch({ kind: "edit", label: "The newer version", change: () => theirs });
    dispatch({ kind: "edit", label: "Keep mine over it", change: () => document });
    saving.keepMine();
  }

  async function takeUp(draft: KeptDraft) {
    const { document: found, changes } = draft;
    dispatch({ kind: "edit", label: "Take up kept work", change: () => found });
    // This desk has it on the shelf before the desk that it was left by lets go of it.
    await keeper.keepNow({
      version: saving.autosave.version,
      changes,
      lastChange: draft.lastChange,
      document: found,
    });
    await kept.forget(draft);
  }

  return {
    editor,
    dispatch,
    saving,
    keepFailure,
    /** Work that was left unsaved on this device, newest first. */
    keptDrafts: kept.drafts,
    takeUp: (draft: KeptDraft) => void takeUp(draft),
    throwAway: (draft: KeptDraft) => void kept.forget(draft),
    keepTheirs,
    keepMine,
  };
}
