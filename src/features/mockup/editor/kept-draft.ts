import { z } from "zod";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";

const keptSchema = z.object({ version: z.number().int().min(0), keptAt: z.iso.datetime(), document: documentSchema });

/** Work that the server does not have, kept in this browser: the version it began from and when it was kept. */
export type KeptDraft = { readonly version: number; readonly keptAt: string; readonly document: MockupDocument };

/** One place per person, shop and job, so that nobody is offered another person's work. */
export type DraftPlace = { readonly personId: string; readonly shop: string; readonly jobId: string };

const keyOf = ({ personId, shop, jobId }: DraftPlace) => `standproud:draft:${personId}:${shop}:${jobId}`;

/** Keeps a draft. False when the browser has no room or does not let pages keep anything. */
export function keepDraft(storage: Storage, place: DraftPlace, draft: KeptDraft): boolean {
  try {
    storage.setItem(keyOf(place), JSON.stringify(draft));
    return true;
  } catch (error) {
    if (error instanceof DOMException) return false;
    throw error;
  }
}

/** The kept draft; null when there is none or it can't be read any more. */
export function findDraft(storage: Storage, place: DraftPlace): KeptDraft | null {
  const text = storage.getItem(keyOf(place));
  if (text === null) return null;
  const kept = keptSchema.safeParse(parsed(text));
  return kept.success ? kept.data : null;
}

export function dropDraft(storage: Storage, place: DraftPlace): void {
  storage.removeItem(keyOf(place));
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
