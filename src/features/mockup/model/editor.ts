import type { MockupDocument } from "#shared/mockup/document.ts";
import { commit, goToStep, type History, redo, startHistory, undo } from "./history.ts";
import { keepChosen, nothingChosen, type Selection } from "./selection.ts";

export type Editor = { readonly history: History; readonly selection: Selection };

/** One change of the document, in words, with what is chosen afterwards when that is something else. */
export type Edit = {
  readonly label: string;
  readonly change: (document: MockupDocument) => MockupDocument;
  /** Edits with the same name that follow one another become one step. */
  readonly together?: string;
  readonly choose?: (document: MockupDocument) => Selection;
};

export type EditorAction =
  | ({ readonly kind: "edit" } & Edit)
  | { readonly kind: "undo" }
  | { readonly kind: "redo" }
  /** To where so many steps are done. */
  | { readonly kind: "go to step"; readonly position: number }
  | { readonly kind: "choose"; readonly selection: Selection };

export function startEditor(document: MockupDocument): Editor {
  return resumeEditor(startHistory(document));
}

/** The editor with the steps of earlier in the session. */
export function resumeEditor(history: History): Editor {
  return { history, selection: nothingChosen };
}

/** The next state of the editor; the same one when the action changed nothing. */
export function nextEditor(editor: Editor, action: EditorAction): Editor {
  const { history, selection } = editor;
  switch (action.kind) {
    case "edit": {
      const { change, label, together = null, choose } = action;
      const next = commit(history, change(history.present), { label, together });
      return next === history ? editor : withHistory(editor, next, choose?.(next.present));
    }
    case "undo":
      return withHistory(editor, undo(history));
    case "redo":
      return withHistory(editor, redo(history));
    case "go to step":
      return withHistory(editor, goToStep(history, action.position));
    case "choose":
      return action.selection === selection ? editor : { history, selection: action.selection };
  }
}

function withHistory(editor: Editor, history: History, chosen?: Selection): Editor {
  if (history === editor.history) return editor;
  return { history, selection: keepChosen(history.present, chosen ?? editor.selection) };
}
