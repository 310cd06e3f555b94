import { z } from "zod";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";

/** Whose work on which job, so that nobody is offered another person's. */
export type DraftPlace = { readonly personId: string; readonly shop: string; readonly jobId: string };

/** Work that the server may not have, kept in this browser. */
export type KeptDraft = {
  /** The desk that it was kept by. Each open desk has its own, so that two tabs never write over one another's. */
  readonly deskId: string;
  /** The version on the server that the work began from. */
  readonly version: number;
  readonly keptAt: string;
  /** How many changes the server did not have, and what the last one was. */
  readonly changes: number;
  readonly lastChange: string | null;
  readonly document: MockupDocument;
};

/** `full` and `forbidden`: why nothing could be kept. */
export type KeepOutcome = "kept" | "full" | "forbidden";

/** Where drafts are kept. What is asked first is done first. */
export type DraftShelf = {
  readonly put: (place: DraftPlace, draft: KeptDraft) => Promise<KeepOutcome>;
  /** Those of a place, newest first; what can't be read any more is left out. None where nothing may be kept. */
  readonly list: (place: DraftPlace) => Promise<KeptDraft[]>;
  readonly remove: (place: DraftPlace, deskId: string) => Promise<void>;
};

const recordSchema = z.object({
  deskId: z.string(),
  version: z.number().int().min(0),
  keptAt: z.iso.datetime(),
  changes: z.number().int().min(0),
  lastChange: z.string().nullable(),
  /** JSON: one long text is stored and read back sooner than a hundred thousand small objects. */
  document: z.string(),
});

/** A draft as it lies on the shelf. */
export const recordOf = (draft: KeptDraft) => ({ ...draft, document: JSON.stringify(draft.document) });

/** The draft of a record, in today's version of the document; null when it is none. */
export function draftOf(record: unknown): KeptDraft | null {
  const parsed = recordSchema.safeParse(record);
  if (!parsed.success) return null;
  const read = readDocument(parsedJson(parsed.data.document));
  return read.ok ? { ...parsed.data, document: read.document } : null;
}

export const newestFirst = (drafts: readonly KeptDraft[]): KeptDraft[] =>
  drafts.toSorted((a, b) => (a.keptAt < b.keptAt ? 1 : -1));

function parsedJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
