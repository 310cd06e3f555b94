import { useState } from "react";
import { useLaidWords } from "../engine/use-laid-words.ts";
import { changedDraft, type LetteringDraft, settingOfDraft } from "../model/lettering-draft.ts";

export type LetteringWriting = ReturnType<typeof useLetteringDraft>;

/** Lettering while it is written, set anew at every change. */
export function useLetteringDraft(first: () => LetteringDraft) {
  const [draft, setDraft] = useState(first);
  const setting = settingOfDraft(draft);
  const { state, shown } = useLaidWords(setting && { face: draft.face, setting });
  const isWhole = state.step === "laid" && state.laid.missing.length === 0 && state.laid.box !== null;
  return {
    draft,
    state,
    /** The letters as they lie, or as they lay a moment ago. */
    shown: setting === null ? null : shown,
    set: (change: Partial<LetteringDraft>) => setDraft((before) => changedDraft(before, change)),
    /** What can be put on the board; null while anything stands in the way. */
    ready:
      isWhole && setting && state.laid.box
        ? {
            setting: { ...setting, face: draft.face, fontSha256: state.fontSha256 },
            letters: state.laid.letters,
            box: state.laid.box,
          }
        : null,
  };
}
