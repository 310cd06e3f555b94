import type { Transaction } from "sequelize";
import type { MailKind, OutgoingMail } from "../models/outgoing-mail.ts";
import type { Draft, NotSent } from "./draft.ts";
import { notesGathered } from "./templates/notes.ts";
import { addressChanged, invitation, newPassword, signInLink } from "./templates/people.ts";
import { yesNeededSoon, yesWasNeeded } from "./templates/reminders.ts";
import { approved, proofIssued, revisionAsked } from "./templates/work.ts";

const templates: Record<MailKind, (mail: OutgoingMail, transaction: Transaction) => Promise<Draft | NotSent>> = {
  "sign in link": signInLink,
  "proof issued": proofIssued,
  invitation,
  "new password": newPassword,
  "address changed": addressChanged,
  "revision asked": revisionAsked,
  approved,
  "notes gathered": notesGathered,
  "yes needed soon": yesNeededSoon,
  "yes was needed": yesWasNeeded,
};

/** The words of a mail from the rows as they are now, or why it should not be sent any more. */
export function compose(mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> {
  return templates[mail.kind](mail, transaction);
}
