import { noteStateAfterReply } from "#shared/lifecycle/note-states.ts";
import { newId } from "../db/new-id.ts";
import { notAllowed, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Reply } from "../models/reply.ts";
import { isInsider, isStaff, nameAt } from "../policies/actor.ts";
import { notePolicy } from "../policies/note.ts";
import { findNote } from "../queries/find-note.ts";
import { gatherNews } from "./gather-news.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

/** Answers a note. The shop's answer makes an open note answered; the client's opens an answered one again. */
export async function replyToNote(context: Context, { noteId, text }: { noteId: string; text: string }): Promise<void> {
  const { actor, transaction, now } = context;
  const { note, on } = await findNote(context, noteId, { lock: true });
  if (!isInsider(actor)) throw notAllowed("Sign in to answer.");
  if (!notePolicy.reply(actor, on.facts, note))
    throw wrongState(`Revision ${on.revision.letter} is ${on.revision.state}: its notes are closed.`);
  const side = isStaff(actor) ? "shop" : "client";
  const reply = await Reply.create(
    {
      id: newId(),
      shopId: note.shopId,
      noteId,
      text,
      side,
      authorId: actor.personId,
      authorName: nameAt(actor, on.loaded.job.clientId),
      createdAt: now,
    },
    { transaction },
  );
  const state = noteStateAfterReply(note.state, side);
  if (state !== note.state) await note.update({ state }, { transaction });
  const kind = state === "open" && side === "client" ? "note opened again" : "note answered";
  await logEvent(context, { shopId: note.shopId, jobId: note.jobId, kind, data: { number: note.number } });
  if (!note.shopOnly) {
    const news = { noteId, revisionId: on.revision.id, what: "answered", replyId: reply.id } as const;
    await gatherNews(context, on.loaded, news);
  }
  await signalJob(context, on.loaded.job, { kind: "note", id: noteId, shopOnly: note.shopOnly });
  await refreshJob(context, on.loaded.job);
}
