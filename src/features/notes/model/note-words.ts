import type { Anchor, Note } from "#shared/contracts/notes.ts";

export type NoteKind = Note["kind"];
export type NoteTone = "must" | "question" | "fine" | "settled";

/** How the kinds are said, and what each asks of the shop. */
export const kindWords: Readonly<Record<NoteKind, { readonly word: string; readonly means: string }>> = {
  "must change": { word: "Must change", means: "I can't approve it like this." },
  question: { word: "Question", means: "I want to know something first." },
  "fine as is": { word: "Fine as is", means: "Keep this, nothing to do." },
};

const tones: Readonly<Record<NoteKind, NoteTone>> = {
  "must change": "must",
  question: "question",
  "fine as is": "fine",
};

/** A settled note is drawn as settled, whatever it asked. */
export const noteTone = ({ kind, state }: Pick<Note, "kind" | "state">): NoteTone =>
  state === "settled" ? "settled" : tones[kind];

/** Where a note is, as it is said on the telephone: "zone B3, Gold ring on layer C", "the whole sign". */
export function placeWords(
  { anchor, zone }: { readonly anchor: Anchor; readonly zone: string | null },
  pieceNames: ReadonlyMap<string, string>,
): string {
  if (anchor.on === "whole") return "the whole sign";
  const piece = anchor.pieceId === null ? undefined : pieceNames.get(anchor.pieceId);
  const layer = anchor.layerKey === null ? "" : `${piece ? " " : ""}on layer ${anchor.layerKey}`;
  return [zone === null ? "a spot on the drawing" : `zone ${zone}`, `${piece ?? ""}${layer}`]
    .filter(Boolean)
    .join(", ");
}

/** "1 open, 1 answered, 2 settled"; states without a note are left out. */
export function countWords(notes: readonly Pick<Note, "state">[]): string {
  if (notes.length === 0) return "none yet";
  return (["open", "answered", "settled"] as const)
    .map((state) => ({ state, count: notes.filter((note) => note.state === state).length }))
    .filter(({ count }) => count > 0)
    .map(({ state, count }) => `${count} ${state}`)
    .join(", ");
}

/** What a balloon is called by those who don't see it. */
export function balloonName(note: Pick<Note, "number" | "kind" | "state" | "zone">): string {
  const zone = note.zone === null ? "" : `, zone ${note.zone}`;
  return `Note ${note.number}${zone}: ${note.kind}, ${note.state}`;
}
