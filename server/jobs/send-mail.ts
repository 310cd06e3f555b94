import type { Transaction } from "sequelize";
import { newToken, tokenHash } from "../auth/tokens.ts";
import { issueUnsubscribeToken } from "../auth/unsubscribe-tokens.ts";
import { closeMail, endMail } from "../commands/close-mail.ts";
import { newId } from "../db/new-id.ts";
import type { Services } from "../http/context.ts";
import { compose } from "../mail/compose.ts";
import type { Draft, LinkOrder } from "../mail/draft.ts";
import { choiceOf } from "../mail/optional-mail.ts";
import { pages } from "../mail/pages.ts";
import { MailDelayed, MailRefused, type Message, send } from "../mail/send.ts";
import { OneTimeLink } from "../models/one-time-link.ts";
import { OutgoingMail } from "../models/outgoing-mail.ts";
import { onlyShopOf } from "../queries/only-shop-of.ts";
import type { Attempt } from "./tasks.ts";

/**
 * Sends one mail: first its words and its link are made and committed, then it goes out, then it is marked as sent. If
 * the process dies in between it goes out once more, with the same Message-ID and a link of its own that works as well.
 * A mail that the server would not take until the last try is refused too, so that nobody waits for it.
 */
export async function sendMail(
  services: Services,
  { mailId }: { mailId: string },
  { isLast }: Attempt = { isLast: false },
): Promise<void> {
  const message = await prepare(services, mailId);
  if (!message) return;
  try {
    await send(services, message);
  } catch (error) {
    const reason = error instanceof MailRefused || error instanceof MailDelayed ? error.message : null;
    if (error instanceof MailRefused || isLast) {
      if (reason === null) services.log.error({ err: error, mailId }, "A mail could not be put together");
      return closeMail(services, mailId, { state: "refused", reason: reason ?? notPutTogether });
    }
    await OutgoingMail.update({ lastError: reason ?? notPutTogether }, { where: { id: mailId } });
    throw error;
  }
  await closeMail(services, mailId, { state: "sent" });
}

const notPutTogether = "The mail could not be put together.";

/** Makes the message, or drops the mail when the rows say that nobody should get it any more. */
async function prepare(services: Services, mailId: string): Promise<Message | null> {
  const { sequelize, env } = services;
  return sequelize.transaction(async (transaction) => {
    const mail = await OutgoingMail.findByPk(mailId, { lock: transaction.LOCK.UPDATE, transaction });
    if (mail?.state !== "queued") return null;
    const draft = await compose(mail, transaction);
    const now = new Date();
    if ("notSent" in draft) {
      await endMail({ transaction, now }, mail, { state: "dropped", reason: draft.notSent });
      return null;
    }
    await mail.update({ attempts: mail.attempts + 1, closedAt: mail.closedAt ?? now }, { transaction });
    const path = await pathOf(mail, draft, transaction);
    return {
      id: mail.id,
      shownTo: await shopToShow(mail, draft, transaction),
      to: mail.address,
      greeting: draft.greeting,
      sender: draft.sender,
      letter: {
        ...draft.letter,
        button: draft.button && path ? { label: draft.button.label, url: env.PUBLIC_URL + path } : null,
        stop: await stopOf(services, mail, { now, transaction }),
      },
    };
  });
}

/** Where the reader stops mails of this kind, unless they are needed. */
async function stopOf(
  { env }: Pick<Services, "env">,
  { kind, shopId, recipientId }: OutgoingMail,
  at: { now: Date; transaction: Transaction },
): Promise<Message["letter"]["stop"]> {
  if (choiceOf(kind) === null || !shopId || !recipientId) return null;
  const token = await issueUnsubscribeToken(env, { personId: recipientId, shopId }, at);
  return { url: env.PUBLIC_URL + pages.unsubscribe(token) };
}

async function pathOf(mail: OutgoingMail, { button }: Draft, transaction: Transaction): Promise<string | null> {
  if (!button) return null;
  return typeof button.leadsTo === "string" ? button.leadsTo : makeLink(mail, button.leadsTo, transaction);
}

/** The shop whose owner may read the mail in the local sink. A link that would open other shops too is shown to none. */
async function shopToShow(mail: OutgoingMail, { button }: Draft, transaction: Transaction): Promise<string | null> {
  const personId = typeof button?.leadsTo === "object" ? button.leadsTo.personId : undefined;
  return personId ? onlyShopOf(personId, transaction) : mail.shopId;
}

/** Makes the link's secret, which from here on is known only to the mail; its hash is kept. */
async function makeLink(mail: OutgoingMail, order: LinkOrder, transaction: Transaction): Promise<string> {
  const token = newToken();
  const now = new Date();
  const { hours, ...whom } = order;
  await OneTimeLink.create(
    {
      id: newId(),
      tokenHash: tokenHash(token),
      mailId: mail.id,
      address: mail.address,
      shopId: mail.shopId,
      ...whom,
      createdAt: now,
      expiresAt: new Date(now.getTime() + hours * 3_600_000),
    },
    { transaction },
  );
  return pages.link(token);
}
