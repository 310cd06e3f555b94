import type { MockupDocument } from "#shared/mockup/document.ts";

/** A document as it was, and in words what was then done to it. */
export type Step = { readonly document: MockupDocument; readonly label: string };

export type History = {
  readonly past: readonly Step[];
  readonly present: MockupDocument;
  readonly future: readonly Step[];
  /** Steps with the same name one after the other become one, as the taps of an arrow key do. */
  readonly together: string | null;
};

/** Older steps are let go: documents share what they have in common, so this is memory for changes only. */
export const mostSteps = 300;

export function startHistory(document: MockupDocument): History {
  return { past: [], present: document, future: [], together: null };
}

/** Takes a new document as one step; the same history when nothing changed. What was undone before is let go. */
export function commit(
  history: History,
  document: MockupDocument,
  { label, together = null }: { label: string; together?: string | null },
): History {
  if (document === history.present) return history;
  const joins = together !== null && together === history.together && history.future.length === 0;
  const past = joins ? history.past : [...history.past, { document: history.present, label }].slice(-mostSteps);
  return { past, present: document, future: [], together };
}

/** One step back; the same history when there is none. */
export function undo(history: History): History {
  const last = history.past.at(-1);
  if (!last) return history;
  const future = [{ document: history.present, label: last.label }, ...history.future];
  return { past: history.past.slice(0, -1), present: last.document, future, together: null };
}

/** One undone step forward again; the same history when there is none. */
export function redo(history: History): History {
  const [next, ...future] = history.future;
  if (!next) return history;
  const past = [...history.past, { document: history.present, label: next.label }];
  return { past, present: next.document, future, together: null };
}
