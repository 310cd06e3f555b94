import { newId } from "../db/new-id.ts";
import type { Context } from "../http/context.ts";
import { enqueue } from "../jobs/queue.ts";
import { type MailData, type MailKind, OutgoingMail } from "../models/outgoing-mail.ts";

/**
 * Puts a mail on its way in the transaction of what causes it. Words and one-time links are made when it is sent,
 * so neither row nor job holds a secret.
 */
export async function queueMail(
  { now, transaction }: Pick<Context, "now" | "transaction">,
  mail: {
    kind: MailKind;
    address: string;
    shopId: string | null;
    jobId?: string | null;
    recipientId?: string | null;
    data: MailData;
  },
): Promise<void> {
  const row = await OutgoingMail.create(
    {
      id: newId(),
      shopId: mail.shopId,
      jobId: mail.jobId ?? null,
      kind: mail.kind,
      recipientId: mail.recipientId ?? null,
      address: mail.address,
      data: mail.data,
      state: "queued",
      createdAt: now,
    },
    { transaction },
  );
  await enqueue(transaction, "send-mail", { mailId: row.id });
}
