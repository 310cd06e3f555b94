import type { Transaction } from "sequelize";
import { Decision } from "../../models/decision.ts";
import type { OutgoingMail } from "../../models/outgoing-mail.ts";
import { aboutRevision } from "../../queries/about-revision.ts";
import { type Draft, type NotSent, notSent } from "../draft.ts";
import { titleOf, toContact, toStaff } from "./addressed.ts";

/** To an approver. */
export async function proofIssued(mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> {
  const about = await aboutRevision(mail, transaction);
  if (!about) return notSent.missing;
  const { revision, shop } = about;
  return toContact(mail, transaction, about, {
    subject: `Revision ${revision.letter} of ${titleOf(about)} is ready to look at`,
    paragraphs: [`${shop.name} has drawn revision ${revision.letter} of ${titleOf(about)} for you.`],
    ...(revision.message ? { quote: revision.message } : {}),
    after: ["Look at it closely, leave notes at the very spot, and then approve it or ask for a revision."],
  });
}

export async function revisionAsked(mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> {
  const about = await aboutRevision(mail, transaction);
  const decision = about && (await Decision.findOne({ where: { revisionId: about.revision.id }, transaction }));
  if (!about || !decision) return notSent.missing;
  return toStaff(mail, transaction, about, {
    subject: `Revision asked: ${titleOf(about)}`,
    paragraphs: [`${decision.byName} asked for a revision of ${titleOf(about)}, revision ${about.revision.letter}.`],
    ...(decision.summary ? { quote: decision.summary } : {}),
    after: [],
  });
}

export async function approved(mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> {
  const about = await aboutRevision(mail, transaction);
  const decision = about && (await Decision.findOne({ where: { revisionId: about.revision.id }, transaction }));
  if (!about || !decision) return notSent.missing;
  const { typedName, byName } = decision;
  const signature = typedName === null || typedName === byName ? "" : `, signed “${typedName}”`;
  return toStaff(mail, transaction, about, {
    subject: `Approved: ${titleOf(about)}, revision ${about.revision.letter}`,
    paragraphs: [`${decision.byName} approved revision ${about.revision.letter} of ${titleOf(about)}${signature}.`],
    after: [],
  });
}
