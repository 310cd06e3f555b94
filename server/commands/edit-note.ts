import { notAllowed, notFound, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import type { Note } from "../models/note.ts";
import { Reply } from "../models/reply.ts";
import { isInsider } from "../policies/actor.ts";
import { notePolicy } from "../policies/note.ts";
import { findNote } from "../queries/find-note.ts";
import type { LoadedRevision } from "../queries/find-revision.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

const tooLate = "It can't be changed any more: what is written stays after five minutes. Leave a reply instead.";

/** Puts right what a note says and what kind it is, by its author and within five minutes. */
export async function editNote(
  context: Context,
  { noteId, text, kind }: { noteId: string; text: string; kind: Note["kind"] },
): Promise<void> {
  const { transaction, now } = context;
  const { note, on } = await findNote(context, noteId, { lock: true });
  refuseLateOrForeign(context, on, note, note);
  if (note.text === text && note.kind === kind) return;
  await note.update({ text, kind, editedAt: now }, { transaction });
  await tell(context, { note, on });
}

/** Puts right what a reply says, by its author and within five minutes. */
export async function editReply(
  context: Context,
  { noteId, replyId, text }: { noteId: string; replyId: string; text: string },
): Promise<void> {
  const { transaction, now } = context;
  const { note, on } = await findNote(context, noteId, { lock: true });
  const reply = await Reply.findOne({ where: { id: replyId, noteId, shopId: note.shopId }, transaction });
  if (!reply) throw notFound("reply");
  refuseLateOrForeign(context, on, note, reply);
  if (reply.text === text) return;
  await reply.update({ text, editedAt: now }, { transaction });
  await tell(context, { note, on });
}

function refuseLateOrForeign(
  { actor, now }: Context,
  on: LoadedRevision,
  note: Note,
  { authorId, createdAt }: { authorId: string; createdAt: Date },
): void {
  if (!isInsider(actor) || authorId !== actor.personId)
    throw notAllowed("What someone wrote is put right by them alone.");
  if (!notePolicy.edit(actor, on.facts, note, { authorId, createdAt, now })) throw wrongState(tooLate);
}

async function tell(context: Context, { note, on }: { note: Note; on: LoadedRevision }): Promise<void> {
  const { shopId, jobId, number, shopOnly } = note;
  await logEvent(context, { shopId, jobId, kind: "note put right", data: { number } });
  await signalJob(context, on.loaded.job, { kind: "note", id: note.id, shopOnly });
  await refreshJob(context, on.loaded.job);
}
