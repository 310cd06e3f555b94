import { z } from "zod";
import { inShop, noContent, nothing, shopSlug, token } from "./common.ts";
import { endpoint } from "./endpoint.ts";

/** The mails that nobody needs, which each reader may stop for each shop. All others are sent in any case. */
const choices = {
  /** What was said about notes, gathered. */
  notes: z.boolean(),
  /** That a yes is needed soon, or was. */
  reminders: z.boolean(),
};

export const mailChoicesSchema = z.strictObject({ shop: shopSlug, shopName: z.string(), ...choices });
export type MailChoices = z.infer<typeof mailChoicesSchema>;

export const listMailChoices = endpoint({
  method: "GET",
  path: "/api/account/mail",
  summary: "Which mails one gets from each shop",
  params: nothing,
  query: nothing,
  body: nothing,
  result: z.strictObject({ items: z.array(mailChoicesSchema) }),
});

export const changeMailChoices = endpoint({
  method: "PATCH",
  path: "/api/shops/:shop/my-mail",
  summary: "Choose which mails one gets from this shop",
  params: inShop,
  query: nothing,
  body: z.strictObject({ notes: choices.notes.optional(), reminders: choices.reminders.optional() }),
  result: mailChoicesSchema,
});

/** Looking at the link of a mail stops nothing: mail scanners open links too. */
export const inspectUnsubscribe = endpoint({
  method: "POST",
  path: "/api/unsubscribe/inspect",
  summary: "Whose mails of which shop a link stops",
  params: nothing,
  query: nothing,
  body: z.strictObject({ token }),
  result: z.strictObject({ shopName: z.string(), addressHint: z.string(), ...choices }),
});

/**
 * Stops the mails that nobody needs, all of this shop's, without signing in (RFC 8058). The mail program posts
 * List-Unsubscribe=One-Click as a form; nothing of the body is needed, since the address says it all.
 */
export const unsubscribe = endpoint({
  method: "POST",
  path: "/unsubscribe/:token",
  summary: "Stop the mails that are not needed, by the link in them",
  params: z.strictObject({ token }),
  query: nothing,
  body: nothing,
  result: noContent,
});
