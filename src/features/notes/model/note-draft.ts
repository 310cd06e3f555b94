import { z } from "zod";
import { anchorSchema, noteKind } from "#shared/contracts/notes.ts";

const draftSchema = z.object({
  text: z.string().max(8000),
  kind: noteKind.nullable(),
  anchor: anchorSchema.nullable(),
  shopOnly: z.boolean(),
});

/** A note that is being written. */
export type NoteDraft = z.infer<typeof draftSchema>;

export const emptyDraft: NoteDraft = { text: "", kind: null, anchor: null, shopOnly: false };

/** A stored draft, or null for anything else. */
export function readNoteDraft(stored: unknown): NoteDraft | null {
  const read = draftSchema.safeParse(stored);
  return read.success ? read.data : null;
}

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
