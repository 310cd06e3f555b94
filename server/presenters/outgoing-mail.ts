import type { z } from "zod";
import type { mailRowSchema, mailSchema } from "#shared/contracts/outgoing-mail.ts";
import type { CaughtMail } from "../mail/sink.ts";

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
