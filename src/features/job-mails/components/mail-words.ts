import type { JobMail } from "#shared/contracts/outgoing-mail.ts";
import { formatInstant } from "@/lib/format.ts";

const names: Readonly<Record<string, string>> = {
  "proof issued": "The proof mail",
  "sign in link": "The mail with a link",
  "revision asked": "The mail that a revision was asked for",
  approved: "The mail of the approval",
  "notes gathered": "The mail of the notes",
  "yes needed soon": "The reminder before the day",
  "yes was needed": "The reminder after the day",
};

/** What a mail is called on screen. */
export const mailName = ({ kind }: Pick<JobMail, "kind">): string => names[kind] ?? "The mail";

/** What became of it, with when and why. */
export function mailState({ state, reason, queuedAt, dueAt, sentAt }: JobMail): string {
  switch (state) {
    case "sent":
      return `sent ${formatInstant(sentAt ?? queuedAt)}`;
    case "refused":
      return `refused: ${reason ?? "no reason was given"}`;
    case "dropped":
      return `not sent: ${reason ?? "nothing was left to tell"}`;
    case "queued":
      if (reason) return `waits for the next try: ${reason}`;
      return dueAt ? `gathers until ${formatInstant(dueAt)}` : "is about to leave";
  }
}
