import type { MailChoice } from "../models/mail-choices.ts";
import type { MailKind } from "../models/outgoing-mail.ts";

const choices: Partial<Record<MailKind, MailChoice>> = {
  "notes gathered": "notes",
  "yes needed soon": "reminders",
  "yes was needed": "reminders",
};

/** The choice by which a person stops mails of a kind; null for what is needed: proofs, decisions, links, addresses, invitations. */
export const choiceOf = (kind: MailKind): MailChoice | null => choices[kind] ?? null;
