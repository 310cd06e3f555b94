import { takesNotes } from "#shared/lifecycle/revision-states.ts";
import { notAllowed, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { notePolicy } from "../policies/note.ts";
import { findNote } from "../queries/find-note.ts";
import { gatherNews } from "./gather-news.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

/** Settles a note (its author does) or opens it again. Asking for the state it has changes nothing. */
export async function setNoteState(
  context: Context,
  { noteId, state }: { noteId: string; state: "settled" | "open" },
): Promise<void> {
  const { note, on } = await findNote(context, noteId, { lock: true });
  if (note.state === state) return;
  if (!takesNotes(on.revision.state))
    throw wrongState(`Revision ${on.revision.letter} is ${on.revision.state}: its notes are closed.`);
  if (!notePolicy.move(context.actor, on.facts, note, state))
    throw notAllowed("A note is settled by the one who left it.");
  const from = note.state;
  await note.update({ state }, { transaction: context.transaction });
  await logEvent(context, {
    shopId: note.shopId,
    jobId: note.jobId,
    kind: state === "settled" ? "note settled" : "note opened again",
    data: { number: note.number },
  });
  if (!note.shopOnly) await gatherNews(context, on.loaded, { noteId, revisionId: on.revision.id, what: "moved", from });
  await signalJob(context, on.loaded.job, { kind: "note", id: noteId, shopOnly: note.shopOnly });
  await refreshJob(context, on.loaded.job);
}
