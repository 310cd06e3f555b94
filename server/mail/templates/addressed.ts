import type { Transaction } from "sequelize";
import { visibleToClient } from "#shared/lifecycle/revision-states.ts";
import { Membership } from "../../models/membership.ts";
import type { OutgoingMail } from "../../models/outgoing-mail.ts";
import { Person } from "../../models/person.ts";
import type { AboutRevision } from "../../queries/about-revision.ts";
import { type Draft, linkHours, linkRemarks, type NotSent, notSent } from "../draft.ts";
import { pages } from "../pages.ts";
import { recipientContact } from "./people.ts";

export const titleOf = ({ job }: Pick<AboutRevision, "job">): string => `“${job.title}” (${job.number})`;

/** With a link that signs in and leads to the sheet. Not once the revision was withdrawn, or the contact is none any more. */
export async function toContact(
  mail: OutgoingMail,
  transaction: Transaction,
  { revision, shop }: AboutRevision,
  letter: Draft["letter"],
): Promise<Draft | NotSent> {
  const found = await recipientContact(mail, transaction);
  if (!found) return notSent.gone;
  if (!visibleToClient(revision.state)) return notSent.withdrawn;
  const { contact } = found;
  return {
    greeting: contact.name,
    sender: shop.name,
    letter: { ...letter, after: [...letter.after, linkRemarks["sign in"]] },
    button: {
      label: `Open the sheet of revision ${revision.letter}`,
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
export async function toStaff(
  { recipientId, address }: OutgoingMail,
  transaction: Transaction,
  { revision, shop }: AboutRevision,
  letter: Draft["letter"],
): Promise<Draft | NotSent> {
  const member =
    recipientId &&
    (await Membership.findOne({
      where: { shopId: shop.id, personId: recipientId, endedAt: null },
      include: [{ model: Person, as: "person" }],
      transaction,
    }));
  if (!member || member.person?.email !== address) return notSent.gone;
  return {
    greeting: member.person.name,
    sender: shop.name,
    letter,
    button: {
      label: `Open the sheet of revision ${revision.letter}`,
      leadsTo: pages.sheet(shop.slug, revision.id),
    },
  };
}
