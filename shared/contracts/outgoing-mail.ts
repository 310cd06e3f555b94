import { z } from "zod";
import { inShop, instant, nothing, pageOf, pageQuery } from "./common.ts";
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
