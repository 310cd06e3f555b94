import type { Transaction } from "sequelize";
import { needsYesBy } from "#shared/lifecycle/needs-yes-by.ts";
import { canDecide } from "#shared/lifecycle/revision-states.ts";
import type { OutgoingMail } from "../../models/outgoing-mail.ts";
import { type AboutRevision, aboutRevision } from "../../queries/about-revision.ts";
import { findMailChoices } from "../../queries/find-mail-choices.ts";
import { type Draft, type NotSent, notSent } from "../draft.ts";
import { titleOf, toContact } from "./addressed.ts";

type Days = { readonly yesBy: string; readonly dueOn: string };

export const yesNeededSoon = (mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> =>
  reminder(mail, transaction, (about, { yesBy, dueOn }) => ({
    subject: `A yes to ${titleOf(about)} is needed by ${dayInWords(yesBy)}`,
    paragraphs: [
      `Revision ${about.revision.letter} of ${titleOf(about)} still waits for your decision.`,
      `To have it ready for ${dayInWords(dueOn)}, ${about.shop.name} needs your yes by ${dayInWords(yesBy)}: after that come the build, the drying and the way to you.`,
    ],
    after: ["If something should change, leave a note at the spot or ask for a revision."],
  }));

export const yesWasNeeded = (mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> =>
  reminder(mail, transaction, (about, { yesBy, dueOn }) => ({
    subject: `A yes to ${titleOf(about)} was needed by ${dayInWords(yesBy)}`,
    paragraphs: [
      `Revision ${about.revision.letter} of ${titleOf(about)} still waits for your decision, which was needed by ${dayInWords(yesBy)}.`,
      `${about.shop.name} may no longer be able to have it ready for ${dayInWords(dueOn)}. Decide now, or talk to the shop about another day.`,
    ],
    after: ["If something should change, leave a note at the spot or ask for a revision."],
  }));

/** Only while the client's decision is what the job waits for. */
async function reminder(
  mail: OutgoingMail,
  transaction: Transaction,
  words: (about: AboutRevision, days: Days) => Draft["letter"],
): Promise<Draft | NotSent> {
  const about = await aboutRevision(mail, transaction);
  if (!about) return notSent.missing;
  const { revision, job, shop } = about;
  if (!canDecide(revision.state) || job.whoseMove !== "client" || job.dueOn === null) return notSent.decided;
  const whom = { personId: mail.recipientId ?? "", shopId: shop.id };
  if (!(await findMailChoices(whom, transaction)).reminders) return notSent.stopped;
  const { buildDays, freightDays } = shop;
  const yesBy = needsYesBy(job.dueOn, { buildDays, freightDays, dryingHours: revision.dryingHours });
  return toContact(mail, transaction, about, words(about, { yesBy, dueOn: job.dueOn }));
}

/** As "Tuesday 6 May 2031", which reads the same on both sides of the ocean. */
function dayInWords(day: string): string {
  const at = new Date(`${day}T00:00:00Z`);
  const part = (options: Intl.DateTimeFormatOptions) =>
    new Intl.DateTimeFormat("en", { ...options, timeZone: "UTC" }).format(at);
  return `${part({ weekday: "long" })} ${part({ day: "numeric" })} ${part({ month: "long" })} ${part({ year: "numeric" })}`;
}
