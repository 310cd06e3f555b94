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

/**
 * The whole session: one step every three seconds through a day of eight hours. Documents share what they have in common,
 * so that a step is memory for its change only, a few kilobytes; older ones are let go rather than the page growing for ever.
 */
export const mostSteps = 10_000;

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

/** Where the document stands after so many steps: back or forward, nothing is let go. The same history when it stands there. */
export function goToStep(history: History, position: number): History {
  const { past, present, future } = history;
  const labels = [...past, ...future].map(({ label }) => label);
  const documents = [...past.map(({ document }) => document), present, ...future.map(({ document }) => document)];
  const to = documents[position];
  if (to === undefined || position === past.length) return history;
  const stepAt = (label: string, document: MockupDocument | undefined): Step => ({ label, document: document ?? to });
  return {
    past: labels.slice(0, position).map((label, index) => stepAt(label, documents[index])),
    present: to,
    future: labels.slice(position).map((label, index) => stepAt(label, documents[position + 1 + index])),
    together: null,
  };
}

export type StepInWords = { readonly position: number; readonly label: string; readonly isUndone: boolean };

/** Every step in words, the newest first; `position` is how many steps are done once it is. The start is not among them. */
export function stepsInWords({ past, future }: History): StepInWords[] {
  return [...past, ...future]
    .map(({ label }, index) => ({ position: index + 1, label, isUndone: index >= past.length }))
    .reverse();
}
