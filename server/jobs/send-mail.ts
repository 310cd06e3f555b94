import type { Transaction } from "sequelize";
import { newToken, tokenHash } from "../auth/tokens.ts";
import { logSystemEvent } from "../commands/log-event.ts";
import { newId } from "../db/new-id.ts";
import type { Services } from "../http/context.ts";
import { compose } from "../mail/compose.ts";
import type { Draft, LinkOrder } from "../mail/draft.ts";
import { pages } from "../mail/pages.ts";
import { MailDelayed, MailRefused, type Message, send } from "../mail/send.ts";
import { OneTimeLink } from "../models/one-time-link.ts";
import { OutgoingMail } from "../models/outgoing-mail.ts";
import { onlyShopOf } from "../queries/only-shop-of.ts";

/**
 * Sends one mail: first its words and its link are made and committed, then it goes out, then it is marked as sent. If
 * the process dies in between it goes out once more, with the same Message-ID and a link of its own that works as well.
 */
export async function sendMail(services: Services, { mailId }: { mailId: string }): Promise<void> {
  const message = await prepare(services, mailId);
  if (!message) return;
  try {
    await send(services, message);
  } catch (error) {
    if (error instanceof MailRefused) return refuse(services, mailId, error.message);
    const reason = error instanceof MailDelayed ? error.message : "The mail could not be put together.";
    await OutgoingMail.update({ lastError: reason }, { where: { id: mailId } });
    throw error;
  }
  await inState(services, mailId, async (mail, transaction) => {
    const now = new Date();
    await mail.update({ state: "sent", sentAt: now, lastError: null }, { transaction });
    if (!mail.shopId) return;
    const { shopId, jobId, kind, address } = mail;
    await logSystemEvent({ now, transaction }, { shopId, jobId, kind: "mail sent", data: { kind, to: address } });
  });
}

/** Makes the message, or drops the mail when the rows say that nobody should get it any more. */
async function prepare({ sequelize, env }: Services, mailId: string): Promise<Message | null> {
  return inState({ sequelize }, mailId, async (mail, transaction) => {
    const draft = await compose(mail, transaction);
    if (!draft) {
      await mail.update({ state: "dropped" }, { transaction });
      return null;
    }
    await mail.update({ attempts: mail.attempts + 1 }, { transaction });
    const path = await pathOf(mail, draft, transaction);
    const button = draft.button && path ? { label: draft.button.label, url: env.PUBLIC_URL + path } : null;
    return {
      id: mail.id,
      shownTo: await shopToShow(mail, draft, transaction),
      to: mail.address,
      greeting: draft.greeting,
      sender: draft.sender,
      letter: { ...draft.letter, button },
    };
  });
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

async function refuse(services: Services, mailId: string, reason: string): Promise<void> {
  await inState(services, mailId, async (mail, transaction) => {
    const now = new Date();
    await mail.update({ state: "refused", lastError: reason }, { transaction });
    await OneTimeLink.update({ killedAt: now }, { where: { mailId, spentAt: null, killedAt: null }, transaction });
    if (!mail.shopId) return;
    const { shopId, jobId, kind, address } = mail;
    const data = { kind, to: address, reason };
    await logSystemEvent({ now, transaction }, { shopId, jobId, kind: "mail refused", data });
  });
}

/** Runs `change` on the locked row while it is still queued; null when it is not. */
function inState<T>(
  { sequelize }: Pick<Services, "sequelize">,
  mailId: string,
  change: (mail: OutgoingMail, transaction: Transaction) => Promise<T>,
): Promise<T | null> {
  return sequelize.transaction(async (transaction) => {
    const mail = await OutgoingMail.findByPk(mailId, { lock: transaction.LOCK.UPDATE, transaction });
    return mail?.state === "queued" ? change(mail, transaction) : null;
  });
}
