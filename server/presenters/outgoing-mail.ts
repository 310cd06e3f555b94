import type { z } from "zod";
import type { JobMail, mailRowSchema, mailSchema } from "#shared/contracts/outgoing-mail.ts";
import type { CaughtMail } from "../mail/sink.ts";
import type { OutgoingMail } from "../models/outgoing-mail.ts";

export function presentMailRow({ id, to, subject, at }: CaughtMail): z.input<typeof mailRowSchema> {
  return { id, to, subject, at: at.toISOString() };
}

/** With its text and the addresses of ours in it, to be followed from the page. */
export function presentMail(mail: CaughtMail, { publicUrl }: { publicUrl: string }): z.input<typeof mailSchema> {
  const links = mail.text.match(/https?:\/\/\S+/g) ?? [];
  return {
    ...presentMailRow(mail),
    from: mail.from,
    text: mail.text,
    links: [...new Set(links)].filter((link) => link.startsWith(`${publicUrl}/`)),
  };
}

/** A mail about a job. `followed`: it was sent again already. */
export function presentJobMail(mail: OutgoingMail, { followed }: { followed: boolean }): JobMail {
  const { id, kind, address, state, lastError, createdAt, dueAt, sentAt } = mail;
  return {
    id,
    kind,
    to: address,
    state,
    reason: lastError ?? null,
    queuedAt: createdAt.toISOString(),
    dueAt: dueAt?.toISOString() ?? null,
    sentAt: sentAt?.toISOString() ?? null,
    can: { sendAgain: state === "refused" && !followed },
  };
}
