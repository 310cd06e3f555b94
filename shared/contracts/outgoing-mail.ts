import { z } from "zod";
import { inShop, instant, noContent, nothing, pageOf, pageQuery } from "./common.ts";
import { endpoint } from "./endpoint.ts";

export const mailRowSchema = z.strictObject({ id: z.string(), to: z.string(), subject: z.string(), at: instant });
export const mailSchema = mailRowSchema.extend({ from: z.string(), text: z.string(), links: z.array(z.string()) });

/** Only while mail goes to the local sink instead of a mail server; not found otherwise. */
export const listOutgoingMail = endpoint({
  method: "GET",
  path: "/api/shops/:shop/outgoing-mail",
  summary: "Mail the local sink caught, newest first",
  params: inShop,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(mailRowSchema),
});
export const getOutgoingMail = endpoint({
  method: "GET",
  path: "/api/shops/:shop/outgoing-mail/:mailId",
  summary: "One caught mail",
  params: inShop.extend({ mailId: z.string().regex(/^[A-Za-z0-9-]{1,80}$/) }),
  query: nothing,
  body: nothing,
  result: mailSchema,
});

const ofJob = inShop.extend({ jobId: z.uuid() });

/** A mail about a job, with what became of it. */
export const jobMailSchema = z.strictObject({
  id: z.uuid(),
  /** What it says, as "proof issued". */
  kind: z.string(),
  to: z.string(),
  state: z.enum(["queued", "sent", "refused", "dropped"]),
  /** What the mail server said to the last try, or why it was dropped. */
  reason: z.string().nullable(),
  queuedAt: instant,
  /** A mail that gathers leaves then. */
  dueAt: instant.nullable(),
  sentAt: instant.nullable(),
  can: z.strictObject({ sendAgain: z.boolean() }),
});
export type JobMail = z.infer<typeof jobMailSchema>;

export const listJobMails = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/mails",
  summary: "Mail about a job with its state, newest first",
  params: ofJob,
  /** `only`: those refused that were not sent again. */
  query: z.strictObject({ ...pageQuery, only: z.literal("refused").optional() }),
  body: nothing,
  result: pageOf(jobMailSchema),
});
export const sendMailAgain = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs/:jobId/mails/:mailId/again",
  summary: "Send a refused mail once more, to the address that its reader has now",
  params: ofJob.extend({ mailId: z.uuid() }),
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});
