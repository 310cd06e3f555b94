import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { Note } from "../models/note.ts";
import { notePolicy } from "../policies/note.ts";
import { findRevision, type LoadedRevision } from "./find-revision.ts";
import { findNoteRow } from "./list-notes.ts";

/**
 * The note of this shop that the actor may see, with the newest revision it stands on, else "not found".
 * With `lock` the job's row is locked before the note is read.
 */
export async function findNote(
  context: ReadContext,
  noteId: string,
  { lock = false }: { lock?: boolean } = {},
): Promise<{ note: Note; on: LoadedRevision }> {
  const known = await Note.findOne({
    where: { id: noteId, shopId: context.shop?.id ?? "" },
    attributes: ["id", "revisionId"],
    transaction: context.transaction,
  });
  if (!known) throw notFound("note");
  const own = await findRevision(context, known.revisionId, { lock });
  const note = await findNoteRow(context, noteId);
  if (!note) throw notFound("note");
  const on = currentOf(own);
  if (!notePolicy.see(context.actor, on.facts, note)) throw notFound("note");
  return { note, on };
}

/** A note that was carried over is talked about on the revision that is out now. */
function currentOf(own: LoadedRevision): LoadedRevision {
  const out = own.loaded.revisions.findLast(({ state }) => state === "issued" || state === "revision asked");
  return out ? { revision: out, loaded: own.loaded, facts: { ...own.facts, state: out.state } } : own;
}
