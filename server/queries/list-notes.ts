import { Op } from "sequelize";
import { z } from "zod";
import type { FrozenNote } from "#shared/mockup/snapshot.ts";
import type { ReadContext } from "../http/context.ts";
import { Event } from "../models/event.ts";
import { Note } from "../models/note.ts";
import { Reply } from "../models/reply.ts";
import { Revision } from "../models/revision.ts";
import { isStaff } from "../policies/actor.ts";
import { places, readCursor } from "./page.ts";

const withReplies = [
  { model: Reply, as: "replies", separate: true, order: ["createdAt", "id"] as string[] },
  { model: Revision, as: "revision", attributes: ["id", "letter", "sequence"] },
];

/**
 * Up to `limit + 1` notes that stand on a revision, by number: its own and, from earlier ones, those not settled before it
 * (carried over; one that is settled here stays, so that it can be seen and opened again). Shop-only notes are left out for
 * a client.
 */
export async function listNotes(
  { actor, transaction }: ReadContext,
  revision: Revision,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<Note[]> {
  const after = readCursor(cursor, z.tuple([places.count]));
  return Note.findAll({
    where: {
      shopId: revision.shopId,
      jobId: revision.jobId,
      ...(isStaff(actor) ? {} : { shopOnly: false }),
      ...(after ? { number: { [Op.gt]: after[0] } } : {}),
      [Op.or]: [
        { revisionId: revision.id },
        {
          "$revision.sequence$": { [Op.lt]: revision.sequence },
          [Op.or]: [{ state: { [Op.ne]: "settled" } }, { number: await numbersSettledOn(revision, transaction) }],
        },
      ],
    },
    include: withReplies,
    order: [["number", "asc"]],
    limit: limit + 1,
    subQuery: false,
    transaction,
  });
}

/** Numbers of the notes that somebody settled once the drawing of this revision was frozen. */
async function numbersSettledOn(
  { shopId, jobId, requestedAt }: Revision,
  transaction: ReadContext["transaction"],
): Promise<number[]> {
  const events = await Event.findAll({
    where: { shopId, jobId, kind: "note settled", at: { [Op.gte]: requestedAt } },
    attributes: ["data"],
    transaction,
  });
  return events.flatMap(({ data }) => ("number" in data ? [data.number] : []));
}

/** The note of this shop with replies and its revision's letter; null when there is none. */
export function findNoteRow({ shop, transaction }: ReadContext, noteId: string): Promise<Note | null> {
  return Note.findOne({ where: { id: noteId, shopId: shop?.id ?? "" }, include: withReplies, transaction });
}

/** What the drawing carries: notes not settled and not shop-only, as they stand. */
export async function notesToFreeze({ transaction }: ReadContext, jobId: string): Promise<FrozenNote[]> {
  const notes = await Note.findAll({
    where: { jobId, shopOnly: false, state: { [Op.ne]: "settled" } },
    include: [{ model: Revision, as: "revision", attributes: ["id", "letter"] }],
    order: [["number", "asc"]],
    transaction,
  });
  return notes.map((note) => ({
    number: note.number,
    kind: note.kind,
    state: note.state,
    text: note.text,
    author: note.authorName,
    fromRevision: note.revision?.letter ?? "",
    zone: note.zone,
  }));
}
