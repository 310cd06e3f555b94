import type { Transaction } from "sequelize";
import { visibleToClient } from "#shared/lifecycle/revision-states.ts";
import { Decision } from "../../models/decision.ts";
import { Job } from "../../models/job.ts";
import { Membership } from "../../models/membership.ts";
import { Note } from "../../models/note.ts";
import type { OutgoingMail } from "../../models/outgoing-mail.ts";
import { Person } from "../../models/person.ts";
import { Reply } from "../../models/reply.ts";
import { Revision } from "../../models/revision.ts";
import { Shop } from "../../models/shop.ts";
import { type Draft, linkHours, linkRemarks } from "../draft.ts";
import { pages } from "../pages.ts";
import { recipientContact } from "./people.ts";

type About = { readonly revision: Revision; readonly job: Job; readonly shop: Shop };

async function aboutRevision({ data, shopId }: OutgoingMail, transaction: Transaction): Promise<About | null> {
  if (!shopId || !data.revisionId) return null;
  const revision = await Revision.findOne({
    where: { id: data.revisionId, shopId },
    include: [{ model: Job, as: "job" }],
    transaction,
  });
  const shop = await Shop.findByPk(shopId, { transaction });
  return revision?.job && shop ? { revision, job: revision.job, shop } : null;
}

const titleOf = ({ job }: About): string => `“${job.title}” (${job.number})`;

/** To an approver. */
export async function proofIssued(mail: OutgoingMail, transaction: Transaction): Promise<Draft | null> {
  const about = await aboutRevision(mail, transaction);
  if (!about) return null;
  const { revision, shop } = about;
  return toContact(mail, transaction, about, {
    subject: `Revision ${revision.letter} of ${titleOf(about)} is ready to look at`,
    paragraphs: [`${shop.name} has drawn revision ${revision.letter} of ${titleOf(about)} for you.`],
    ...(revision.message ? { quote: revision.message } : {}),
    after: ["Look at it closely, leave notes at the very spot, and then approve it or ask for a revision."],
  });
}

export async function revisionAsked(mail: OutgoingMail, transaction: Transaction): Promise<Draft | null> {
  const about = await aboutRevision(mail, transaction);
  const decision = about && (await Decision.findOne({ where: { revisionId: about.revision.id }, transaction }));
  if (!about || !decision) return null;
  return toStaff(mail, transaction, about, {
    subject: `Revision asked: ${titleOf(about)}`,
    paragraphs: [`${decision.byName} asked for a revision of ${titleOf(about)}, revision ${about.revision.letter}.`],
    ...(decision.summary ? { quote: decision.summary } : {}),
    after: [],
  });
}

export async function approved(mail: OutgoingMail, transaction: Transaction): Promise<Draft | null> {
  const about = await aboutRevision(mail, transaction);
  const decision = about && (await Decision.findOne({ where: { revisionId: about.revision.id }, transaction }));
  if (!about || !decision) return null;
  const { typedName, byName } = decision;
  const signature = typedName === null || typedName === byName ? "" : `, signed “${typedName}”`;
  return toStaff(mail, transaction, about, {
    subject: `Approved: ${titleOf(about)}, revision ${about.revision.letter}`,
    paragraphs: [`${decision.byName} approved revision ${about.revision.letter} of ${titleOf(about)}${signature}.`],
    after: [],
  });
}

export async function noteAdded(mail: OutgoingMail, transaction: Transaction): Promise<Draft | null> {
  const about = await aboutRevision(mail, transaction);
  const { noteId } = mail.data;
  const note = about && noteId && (await Note.findOne({ where: { id: noteId, shopId: about.shop.id }, transaction }));
  if (!about || !note) return null;
  const isForClient = mail.data.contactId !== undefined;
  if (isForClient && note.shopOnly) return null;
  const write = isForClient ? toContact : toStaff;
  return write(mail, transaction, about, {
    subject: `Note ${note.number} on ${titleOf(about)}, revision ${about.revision.letter}`,
    paragraphs: [
      `${note.authorName} left note ${note.number} on revision ${about.revision.letter} of ${titleOf(about)}.`,
    ],
    quote: note.text,
    after: [],
  });
}

export async function noteAnswered(mail: OutgoingMail, transaction: Transaction): Promise<Draft | null> {
  const about = await aboutRevision(mail, transaction);
  const { noteId, replyId } = mail.data;
  if (!about || !noteId || !replyId) return null;
  const shopId = about.shop.id;
  const note = await Note.findOne({ where: { id: noteId, shopId }, transaction });
  const reply = await Reply.findOne({ where: { id: replyId, noteId, shopId }, transaction });
  if (!note || !reply) return null;
  const isForClient = mail.data.contactId !== undefined;
  if (isForClient && note.shopOnly) return null;
  const write = isForClient ? toContact : toStaff;
  return write(mail, transaction, about, {
    subject: `Answer to note ${note.number} on ${titleOf(about)}, revision ${about.revision.letter}`,
    paragraphs: [`${reply.authorName} answered note ${note.number} (“${opening(note.text)}”) on ${titleOf(about)}.`],
    quote: reply.text,
    after: [],
  });
}

/** As much of a note as tells it from the others. */
function opening(text: string): string {
  const line = text.replace(/\s+/g, " ").trim();
  return line.length > 80 ? `${line.slice(0, 79).trimEnd()}…` : line;
}

/** With a link that signs in and leads to the sheet. Not once the revision was withdrawn, or the contact is none any more. */
async function toContact(
  mail: OutgoingMail,
  transaction: Transaction,
  { revision, shop }: About,
  letter: Draft["letter"],
): Promise<Draft | null> {
  const found = await recipientContact(mail, transaction);
  if (!found || !visibleToClient(revision.state)) return null;
  const { contact } = found;
  return {
    greeting: contact.name,
    sender: shop.name,
    letter: { ...letter, after: [...letter.after, linkRemarks["sign in"]] },
    button: {
      label: "Open the sheet",
      leadsTo: {
        purpose: "sign in",
        hours: linkHours["sign in"],
        contactId: contact.id,
        personId: contact.personId,
        goTo: pages.sheet(shop.slug, revision.id),
      },
    },
  };
}

/** Staff sign in with a password, so their mails lead to the plain page. Only to someone still on the team. */
async function toStaff(
  { recipientId, address }: OutgoingMail,
  transaction: Transaction,
  { revision, shop }: About,
  letter: Draft["letter"],
): Promise<Draft | null> {
  if (!recipientId) return null;
  const member = await Membership.findOne({
    where: { shopId: shop.id, personId: recipientId, endedAt: null },
    include: [{ model: Person, as: "person" }],
    transaction,
  });
  if (member?.person?.email !== address) return null;
  return {
    greeting: member.person.name,
    sender: shop.name,
    letter,
    button: { label: "Open the sheet", leadsTo: pages.sheet(shop.slug, revision.id) },
  };
}
