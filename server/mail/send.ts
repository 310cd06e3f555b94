import { createTransport } from "nodemailer";
import type { Services } from "../http/context.ts";
import { withoutSecrets } from "../http/without-secrets.ts";
import { headerLine, type Letter, letterHtml, letterText } from "./letter.ts";
import { shopHeader } from "./sink.ts";

export type Message = {
  /** The mail's id; sending it twice gives both the same Message-ID, so that the reader's program can tell. */
  readonly id: string;
  /** Whose owner sees it in the local sink. */
  readonly shownTo: string | null;
  readonly to: string;
  readonly greeting: string;
  /** The shop's name; null when the mail is ours. */
  readonly sender: string | null;
  readonly letter: Letter;
};

/** The mail server will never take this mail. Its words are kept, without what the mail holds. */
export class MailRefused extends Error {
  override readonly name = "MailRefused";
}

/** The mail did not go out this time. */
export class MailDelayed extends Error {
  override readonly name = "MailDelayed";
}

/** Hands one mail to the mail server, or to the local sink. Throws MailRefused or MailDelayed. */
export async function send({ env, mailSink }: Pick<Services, "env" | "mailSink">, message: Message): Promise<void> {
  const from = senderOf(env.MAIL_FROM);
  const frame = { greeting: message.greeting, sender: message.sender ?? from.name };
  const transport = createTransport({
    url: env.SMTP_URL ?? mailSink?.url ?? "",
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  try {
    await transport.sendMail({
      messageId: `<${message.id}@${from.address.split("@").at(-1)}>`,
      from: { name: headerLine(message.sender ?? from.name, 120), address: from.address },
      to: { name: "", address: message.to },
      subject: headerLine(message.letter.subject),
      text: letterText(message.letter, frame),
      html: letterHtml(message.letter, frame),
      headers: {
        "Auto-Submitted": "auto-generated",
        ...stopHeaders(message.letter),
        ...(mailSink && message.shownTo ? { [shopHeader]: message.shownTo } : {}),
      },
    });
  } catch (error) {
    throw failureOf(error);
  } finally {
    transport.close();
  }
}

/**
 * How a mail program stops mails like this one (RFC 2369, RFC 8058). The one click is promised by https only, as it has to be. There is no
 * address to write to: nobody reads what comes in.
 */
export function stopHeaders({ stop }: Pick<Letter, "stop">): Record<string, string> {
  if (!stop) return {};
  return {
    "List-Unsubscribe": `<${stop.url}>`,
    ...(stop.url.startsWith("https:") ? { "List-Unsubscribe-Post": "List-Unsubscribe=One-Click" } : {}),
  };
}

/** "Name <address>" or a bare address. */
function senderOf(text: string): { name: string; address: string } {
  const [, name = "", address = text] = /^\s*"?([^"<]*?)"?\s*<([^<>\s]+)>\s*$/.exec(text) ?? [];
  return { name: name || "Standproud", address: address.trim() };
}

/**
 * A reply of the 500s to this mail is final (RFC 5321, 4.2.1). Such a reply to our own sign-in is the server's set-up
 * and may be mended, so the mail waits.
 */
function failureOf(error: unknown): MailRefused | MailDelayed {
  if (!(error instanceof Error)) return new MailDelayed(withoutSecrets(String(error)));
  const { responseCode, code, response } = error as Error & {
    responseCode?: number;
    code?: string;
    response?: unknown;
  };
  // What the server said, where it said something; the mailer's own words are about its side of the talk.
  const words = withoutSecrets(headerLine(typeof response === "string" ? response : error.message, 400));
  const isFinal = responseCode !== undefined && responseCode >= 500 && code !== "EAUTH";
  return isFinal || (code === "EENVELOPE" && responseCode === undefined)
    ? new MailRefused(words)
    : new MailDelayed(words);
}
