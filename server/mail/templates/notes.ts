import type { Transaction } from "sequelize";
import { revisionOut } from "#shared/lifecycle/revision-row.ts";
import { visibleToClient } from "#shared/lifecycle/revision-states.ts";
import { Job } from "../../models/job.ts";
import { Note } from "../../models/note.ts";
import type { NoteNews, OutgoingMail } from "../../models/outgoing-mail.ts";
import { Reply } from "../../models/reply.ts";
import { Revision } from "../../models/revision.ts";
import { Shop } from "../../models/shop.ts";
import { findMailChoices } from "../../queries/find-mail-choices.ts";
import { revisionColumns } from "../../queries/load-jobs.ts";
import { type Draft, type NotSent, notSent } from "../draft.ts";
import type { LetterNote } from "../letter.ts";
import { titleOf, toContact, toStaff } from "./addressed.ts";

/** A mail is no place to read more of them; the sheet has them all. */
const mostNotes = 40;

/** Everything that happened to the notes of a job since the mail before, each as it stands now. */
export async function notesGathered(mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> {
  const { shopId, jobId, recipientId, data } = mail;
  const job = jobId && shopId && (await Job.findOne({ where: { id: jobId, shopId }, transaction }));
  const shop = shopId && (await Shop.findByPk(shopId, { transaction }));
  if (!job || !shop || !data.news) return notSent.missing;
  const whom = { personId: recipientId ?? "", shopId: shop.id };
  if (!(await findMailChoices(whom, transaction)).notes) return notSent.stopped;
  const isForClient = data.contactId !== undefined;
  const revisions = await Revision.findAll({
    where: { jobId: job.id },
    attributes: revisionColumns,
    order: ["sequence"],
    transaction,
  });
  const seen = revisions.filter(({ state }) => visibleToClient(state));
  const unseen = data.news.slice(data.seen ?? 0);
  if (unseen.length === 0) return notSent.seen;
  const news = unseen.filter(({ revisionId }) => seen.some(({ id }) => id === revisionId));
  if (news.length === 0) return notSent.withdrawn;
  const told = await tellNotes(news, { job, isForClient, transaction });
  if (told.length === 0) return notSent.nothing;
  const revision = revisionOut(seen) ?? seen.at(-1);
  if (!revision) return notSent.withdrawn;
  const about = { job, shop, revision };
  const count = countInWords(told);
  const write = isForClient ? toContact : toStaff;
  return write(mail, transaction, about, {
    subject: `${count} on ${titleOf(about)}, revision ${revision.letter}`,
    paragraphs: [`What was said about ${titleOf(about)}: ${count}.`],
    notes: told.slice(0, mostNotes).map(({ letterNote }) => letterNote),
    after: told.length > mostNotes ? [`${told.length - mostNotes} more stand on the sheet.`] : [],
  });
}

type Told = {
  readonly left: boolean;
  readonly answers: number;
  readonly now: Note["state"];
  readonly letterNote: LetterNote;
};

/** The notes by number, without those that nothing is left to tell of. */
async function tellNotes(
  news: readonly NoteNews[],
  { job, isForClient, transaction }: { job: Job; isForClient: boolean; transaction: Transaction },
): Promise<Told[]> {
  const notes = await Note.findAll({
    where: {
      id: [...new Set(news.map(({ noteId }) => noteId))],
      shopId: job.shopId,
      jobId: job.id,
      ...(isForClient ? { shopOnly: false } : {}),
    },
    order: ["number"],
    transaction,
  });
  const replies = await Reply.findAll({
    where: { id: news.flatMap(({ replyId }) => replyId ?? []), shopId: job.shopId },
    order: ["createdAt", "id"],
    transaction,
  });
  return notes.flatMap((note) => {
    const own = news.filter(({ noteId }) => noteId === note.id);
    const left = own.some(({ what }) => what === "left");
    const answers = replies.filter(({ noteId }) => noteId === note.id);
    const before = own.find(({ what }) => what === "moved")?.from;
    const moved = before !== undefined && before !== note.state;
    if (!left && answers.length === 0 && !moved) return [];
    return [{ left, answers: answers.length, now: note.state, letterNote: letterNoteOf(note, answers, { left }) }];
  });
}

function letterNoteOf(note: Note, answers: readonly Reply[], { left }: { left: boolean }): LetterNote {
  const { number, zone, kind, state, text, authorName } = note;
  return {
    number,
    about: [zone ? `zone ${zone}` : null, kind, state].filter((part) => part !== null).join(", "),
    said: [
      { who: authorName, text: left ? text : opening(text) },
      ...answers.map((answer) => ({ who: `${answer.authorName} answered`, text: answer.text })),
    ],
  };
}

/** As "3 notes, 1 answer"; a note that only changed its state counts as that. */
function countInWords(told: readonly Told[]): string {
  const left = told.filter((each) => each.left).length;
  const answers = told.reduce((sum, each) => sum + each.answers, 0);
  const moved = told.filter((each) => !each.left && each.answers === 0);
  const settled = moved.filter(({ now }) => now === "settled").length;
  const count = (of: number, one: string, more: string): string[] =>
    of === 0 ? [] : [`${of} ${of === 1 ? one : more}`];
  return [
    ...count(left, "note", "notes"),
    ...count(answers, "answer", "answers"),
    ...count(settled, "note settled", "notes settled"),
    ...count(moved.length - settled, "note opened again", "notes opened again"),
  ].join(", ");
}

/** As much of a note as tells it from the others. */
function opening(text: string): string {
  const line = text.replace(/\s+/g, " ").trim();
  return line.length > 80 ? `${line.slice(0, 79).trimEnd()}…` : line;
}
