import { useState } from "react";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { BareSign } from "../engine/lay-board.ts";
import { useLaidBoard } from "../engine/use-laid-board.ts";
import { backerOfDraft, frameOfDraft } from "../model/backer-draft.ts";
import { type BoardDraft, boardOfDraft, draftOfBoard, fieldsOfDraft } from "../model/board-draft.ts";
import { type BoardProblems, boardProblems, hasProblems } from "../model/board-problems.ts";
import { setBoard } from "../model/commands/set-board.ts";
import { isSame } from "../model/same.ts";
import { useDesk } from "./desk-context.ts";

export type BoardWriting = ReturnType<typeof useBoardDraft>;

/** The board while it is written in a form. It is taken as one step, with nothing but what was changed. */
export function useBoardDraft() {
  const { document, stock, unit, edit } = useDesk();
  const [draft, setDraft] = useState(() => draftOfBoard(document, unit, stock.woods));
  const [tried, setTried] = useState(false);
  const { state: laying, shown } = useLaidBoard(signOfDraft(draft, document));
  const refusals = laying.step === "laid" ? laying.laid.refusals : undefined;
  const problems = boardProblems(draft, document, unit, refusals);
  return {
    draft,
    problems,
    /** Whether anything is written that the document does not have. */
    isChanged: !isSame(draft, draftOfBoard(document, unit, stock.woods)),
    /** Whether what is missing is to be said, and not only what is wrong. */
    tried,
    /** Slats and frame as they lie, and those that lay a moment ago. */
    laying,
    shown,
    set: (more: Partial<BoardDraft>) => setDraft((before) => ({ ...before, ...more })),
    /** An empty or half-written field is let be until the whole is to be taken. */
    problemOf: (field: keyof BoardProblems["fields"], value: unknown): string | undefined =>
      isSayable(value, tried) ? problems.fields[field] : undefined,
    slatProblemOf: (field: keyof BoardProblems["slats"], value: unknown): string | undefined =>
      isSayable(value, tried) ? problems.slats[field] : undefined,
    frameProblemOf: (field: keyof BoardProblems["frame"], value: unknown): string | undefined =>
      isSayable(value, tried) ? problems.frame[field] : undefined,
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

const isSayable = (value: unknown, tried: boolean): boolean => tried || (value !== null && !Number.isNaN(value));

/** What slats and frame are laid out for; null where neither is chosen, or while their measures are half-written. */
function signOfDraft(draft: BoardDraft, document: MockupDocument): BareSign | null {
  const backer = backerOfDraft(draft, []);
  const frame = frameOfDraft(draft);
  return backer.slats || frame ? { board: boardOfDraft(draft, document), backer, frame } : null;
}
