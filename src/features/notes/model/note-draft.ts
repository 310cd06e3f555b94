import type { Anchor, Note } from "#shared/contracts/notes.ts";
import { noteKinds } from "#shared/lifecycle/note-states.ts";

/** A note that is being written. */
export type NoteDraft = {
  readonly text: string;
  readonly kind: Note["kind"] | null;
  readonly anchor: Anchor | null;
  readonly shopOnly: boolean;
};

export const emptyDraft: NoteDraft = { text: "", kind: null, anchor: null, shopOnly: false };

/** A stored draft, or null for anything else: what lies in a browser's store may be of an older day or of another's making. */
export function readNoteDraft(stored: unknown): NoteDraft | null {
  const { text, kind, anchor, shopOnly } = fieldsOf(stored);
  if (typeof text !== "string" || text.length > 8000 || typeof shopOnly !== "boolean") return null;
  const known = noteKinds.find((one) => one === kind) ?? null;
  const place = readAnchor(anchor);
  if (place === undefined || (kind !== null && known === null)) return null;
  return { text, kind: known, anchor: place, shopOnly };
}

/** The anchor of a stored draft; undefined for what is none. */
function readAnchor(stored: unknown): Anchor | null | undefined {
  if (stored === null) return null;
  const { on, x, y, layerKey, pieceId } = fieldsOf(stored);
  if (on === "whole") return { on };
  if (on !== "spot" || typeof x !== "number" || typeof y !== "number") return undefined;
  if (!isTextOrNull(layerKey) || !isTextOrNull(pieceId)) return undefined;
  return { on, x, y, layerKey, pieceId };
}

const isTextOrNull = (value: unknown): value is string | null => value === null || typeof value === "string";

const fieldsOf = (value: unknown): Readonly<Record<string, unknown>> =>
  typeof value === "object" && value !== null ? (value as Readonly<Record<string, unknown>>) : {};

export type DraftGaps = { readonly anchor?: string; readonly kind?: string; readonly text?: string };

/** What a draft still lacks before it can be sent, each with what to do. */
export function draftGaps({ text, kind, anchor }: NoteDraft): DraftGaps {
  return {
    ...(anchor === null ? { anchor: "Touch the spot on the drawing, or choose from the list." } : {}),
    ...(kind === null ? { kind: "Choose what kind of note it is." } : {}),
    ...(text.trim() === "" ? { text: "Write something first." } : {}),
    ...(text.trim().length > 4000 ? { text: "At most 4000 characters." } : {}),
  };
}
