import type { RevisionDocument } from "#shared/contracts/revision-documents.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";
import type { Revision } from "../models/revision.ts";

/** The frozen mockup in today's version; what is stored, and its hash, stay as they were. */
export function presentRevisionDocument(
  { id, letter, state }: Pick<Revision, "id" | "letter" | "state">,
  { document }: Pick<Snapshot, "document">,
): RevisionDocument {
  const read = readDocument(document);
  if (!read.ok) throw new Error(`The frozen mockup of revision ${id} can't be read: ${read.reason}`);
  return { revisionId: id, letter, state, document: read.document };
}
