import type { Transaction } from "sequelize";
import type { MailKind, OutgoingMail } from "../models/outgoing-mail.ts";
import type { Draft } from "./draft.ts";
import { addressChanged, invitation, newPassword, signInLink } from "./templates/people.ts";
import { approved, noteAdded, noteAnswered, proofIssued, revisionAsked } from "./templates/work.ts";

const templates: Record<MailKind, (mail: OutgoingMail, transaction: Transaction) => Promise<Draft | null>> = {
  "sign in link": signInLink,
  "proof issued": proofIssued,
  invitation,
  "new password": newPassword,
  "address changed": addressChanged,
  "revision asked": revisionAsked,
  approved,
  "note added": noteAdded,
  "note answered": noteAnswered,
};

/** The words of a mail from the rows as they are now; null when it should not be sent any more. */
export function compose(mail: OutgoingMail, transaction: Transaction): Promise<Draft | null> {
  return templates[mail.kind](mail, transaction);
}
