import { useState } from "react";
import { type BoardDraft, draftOfBoard, fieldsOfDraft } from "../model/board-draft.ts";
import { type BoardProblems, boardProblems, hasProblems } from "../model/board-problems.ts";
import { setBoard } from "../model/commands/set-board.ts";
import { isSame } from "../model/same.ts";
import { useDesk } from "./desk-context.ts";

export type BoardWriting = ReturnType<typeof useBoardDraft>;

/** The board while it is written in a form. It is taken as one step, with nothing but what was changed. */
export function useBoardDraft() {
  const { document, unit, edit } = useDesk();
  const [draft, setDraft] = useState(() => draftOfBoard(document, unit));
  const [tried, setTried] = useState(false);
  const problems = boardProblems(draft, document, unit);
  return {
    draft,
    problems,
    /** Whether anything is written that the document does not have. */
    isChanged: !isSame(draft, draftOfBoard(document, unit)),
    /** Whether what is missing is to be said, and not only what is wrong. */
    tried,
    set: (more: Partial<BoardDraft>) => setDraft((before) => ({ ...before, ...more })),
    /** An empty or half-written field is let be until the whole is to be taken. */
    problemOf: (field: keyof BoardProblems["fields"], value: unknown): string | undefined =>
      tried || (value !== null && !Number.isNaN(value)) ? problems.fields[field] : undefined,
    /** Puts the draft into the document. False when something stands in the way. */
    take(): boolean {
      setTried(true);
      if (hasProblems(problems)) return false;
      edit({
        label: "Change the board",
        change: (before) => setBoard(before, fieldsOfDraft(draft, document, unit)),
      });
      return true;
    },
  };
}
