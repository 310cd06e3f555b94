import { newId } from "../db/new-id.ts";
import type { Context } from "../http/context.ts";
import { enqueue } from "../jobs/queue.ts";
import { type MailData, type MailKind, OutgoingMail } from "../models/outgoing-mail.ts";

export type MailOrder = {
  readonly kind: MailKind;
  readonly address: string;
  readonly shopId: string | null;
  readonly jobId?: string | null;
  readonly recipientId?: string | null;
  readonly data: MailData;
  /** The refused mail that this one goes in place of. */
  readonly follows?: string;
  /** It tells what it tells, even if more happens before it leaves. */
  readonly gathersNoMore?: boolean;
  /** How long it waits for more to tell, seconds. */
  readonly inSeconds?: number;
};

/**
 * Puts a mail on its way in the transaction of what causes it. Words and one-time links are made when it is sent,
 * so neither row nor job holds a secret.
 */
export async function queueMail(
  { now, transaction }: Pick<Context, "now" | "transaction">,
  { jobId = null, recipientId = null, follows, gathersNoMore = false, inSeconds = 0, ...mail }: MailOrder,
): Promise<void> {
  const row = await OutgoingMail.create(
    {
      id: newId(),
      ...mail,
      jobId,
      recipientId,
      state: "queued",
      createdAt: now,
      follows: follows ?? null,
      closedAt: gathersNoMore ? now : null,
      dueAt: inSeconds > 0 ? new Date(now.getTime() + inSeconds * 1000) : null,
    },
    { transaction },
  );
  // What happened some time ago, as everything in the demo's past did, has waited already.
  const waitedSeconds = Math.max(0, (Date.now() - now.getTime()) / 1000);
  const leftSeconds = Math.max(0, Math.ceil(inSeconds - waitedSeconds));
  await enqueue(transaction, "send-mail", { mailId: row.id }, { inSeconds: leftSeconds });
}
