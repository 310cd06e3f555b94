import type { Transaction } from "sequelize";
import type { Services } from "../http/context.ts";
import { Job } from "../models/job.ts";
import { OneTimeLink } from "../models/one-time-link.ts";
import { OutgoingMail } from "../models/outgoing-mail.ts";
import { logSystemEvent } from "./log-event.ts";
import { signalJob } from "./signal-job.ts";

export type MailEnd =
  | { readonly state: "sent" }
  /** The mail server's words, or why nobody should get the mail any more. */
  | { readonly state: "refused" | "dropped"; readonly reason: string };

/**
 * Writes what became of a queued mail on its row and in the log of its shop. One that was refused has its link killed, since nobody has
 * it, and the shop's people who look at the job are told. Does nothing to a mail that is no longer queued.
 */
export async function closeMail(services: Services, mailId: string, end: MailEnd): Promise<void> {
  await services.sequelize.transaction(async (transaction) => {
    const known = await OutgoingMail.findByPk(mailId, { attributes: ["id", "jobId"], transaction });
    // Whoever changes a job's notes locks the job before its mails: the same order here.
    const job =
      known?.jobId && end.state === "refused"
        ? await Job.findByPk(known.jobId, { attributes: ["id", "shopId"], lock: true, transaction })
        : null;
    const mail = await OutgoingMail.findByPk(mailId, { lock: transaction.LOCK.UPDATE, transaction });
    if (mail?.state !== "queued") return;
    const now = new Date();
    await endMail({ transaction, now }, mail, end);
    if (job) await signalJob({ services, transaction, now }, job, { kind: "job", id: job.id, shopOnly: true });
  });
}

/** The same for a mail whose row the caller holds locked, without telling those who look. */
export async function endMail(
  { transaction, now }: { transaction: Transaction; now: Date },
  mail: OutgoingMail,
  end: MailEnd,
): Promise<void> {
  const outcome = end.state === "sent" ? { sentAt: now, lastError: null } : { lastError: end.reason };
  await mail.update({ state: end.state, closedAt: mail.closedAt ?? now, ...outcome }, { transaction });
  if (end.state === "refused") {
    const open = { mailId: mail.id, spentAt: null, killedAt: null };
    await OneTimeLink.update({ killedAt: now }, { where: open, transaction });
  }
  const { shopId, jobId, kind, address: to } = mail;
  if (!shopId) return;
  const at = { now, transaction };
  if (end.state === "sent") await logSystemEvent(at, { shopId, jobId, kind: "mail sent", data: { kind, to } });
  else if (end.state === "refused")
    await logSystemEvent(at, { shopId, jobId, kind: "mail refused", data: { kind, to, reason: end.reason } });
  else await logSystemEvent(at, { shopId, jobId, kind: "mail dropped", data: { kind, to, reason: end.reason } });
}
