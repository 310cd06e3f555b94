import { takesNotes } from "#shared/lifecycle/revision-states.ts";
import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { Note } from "../models/note.ts";
import type { Revision } from "../models/revision.ts";
import { notePolicy } from "../policies/note.ts";
import { findJob } from "./find-job.ts";
import { type LoadedRevision, revisionFacts } from "./find-revision.ts";
import { findNoteRow } from "./list-notes.ts";
import type { LoadedJob } from "./load-jobs.ts";

/**
 * The note of this shop that the actor may see, with the revision it is talked about on, else "not found".
 * With `lock` the job's row is locked before the note is read.
 */
export async function findNote(
  context: ReadContext,
  noteId: string,
  { lock = false }: { lock?: boolean } = {},
): Promise<{ note: Note; on: LoadedRevision }> {
  const known = await Note.findOne({
    where: { id: noteId, shopId: context.shop?.id ?? "" },
    attributes: ["id", "jobId"],
    transaction: context.transaction,
  });
  if (!known) throw notFound("note");
  const loaded = await findJob(context, known.jobId, { lock });
  const note = await findNoteRow(context, noteId);
  const revision = note && talkedAboutOn(loaded, note);
  if (!note || !revision) throw notFound("note");
  const on = { revision, loaded, facts: revisionFacts(loaded, revision) };
  if (!notePolicy.see(context.actor, on.facts, note)) throw notFound("note");
  return { note, on };
}

/** A note that was carried over is talked about on the revision that is out now, even when its own was withdrawn. */
function talkedAboutOn({ revisions }: LoadedJob, note: Note): Revision | null {
  return (
    revisions.findLast(({ state }) => takesNotes(state)) ?? revisions.find(({ id }) => id === note.revisionId) ?? null
  );
}
