import { z } from "zod";
import { addresses } from "./addresses.ts";
import { email, instant, noContent, nothing, password, personName, shopSlug, token, writtenLine } from "./common.ts";
import { endpoint } from "./endpoint.ts";

export const role = z.enum(["owner", "maker", "rep"]);
export type Role = z.infer<typeof role>;

const place = z.strictObject({ shop: shopSlug, shopName: z.string() });

export const meSchema = z.strictObject({
  person: z.strictObject({ id: z.uuid(), name: z.string(), email: z.string(), hasPassword: z.boolean() }).nullable(),
  /** How this session began. A session begun by a mailed link acts for a client only, never for a shop. */
  session: z.enum(["password", "link"]).nullable(),
  memberOf: z.array(place.extend({ role })),
  contactOf: z.array(place.extend({ client: z.string() })),
});
export type Me = z.infer<typeof meSchema>;

export const whoAmI = endpoint({
  ...addresses.whoAmI,
  summary: "Who is signed in, and where",
  params: nothing,
  query: nothing,
  body: nothing,
  result: meSchema,
});

export const registerShop = endpoint({
  method: "POST",
  path: "/api/register",
  summary: "Open a shop; the first person owns it",
  params: nothing,
  query: nothing,
  body: z.strictObject({
    shopName: writtenLine(120, "Write the shop's name."),
    name: personName,
    email,
    password,
  }),
  result: z.strictObject({ shop: shopSlug }),
  status: 201,
});

export const linkPurpose = z.enum(["sign in", "join shop", "new password"]);

/** Looking at a link never spends it: mail scanners open links too. */
export const inspectLink = endpoint({
  method: "POST",
  path: "/api/links/inspect",
  summary: "What a mailed link is for, and whether it still holds",
  params: nothing,
  query: nothing,
  body: z.strictObject({ token }),
  result: z.strictObject({
    state: z.enum(["open", "spent", "expired", "unknown"]),
    purpose: linkPurpose.nullable(),
    shopName: z.string().nullable(),
    /** As c•••••@orrery.example. */
    addressHint: z.string().nullable(),
    /** Join shop: someone with this address has a password already, so they sign in to accept. */
    knownPerson: z.boolean(),
    role: role.nullable(),
    /** Where to go once the link has been used, a path of this application. */
    goTo: z.string().nullable(),
  }),
});

/** Always answers the same, whatever the token was. */
export const sendFreshLink = endpoint({
  method: "POST",
  path: "/api/links/fresh",
  summary: "Send a fresh link to the address the old one went to",
  params: nothing,
  query: nothing,
  body: z.strictObject({ token }),
  result: noContent,
  status: 202,
});

/** Always answers the same, whether the address is known or not. */
export const requestLink = endpoint({
  method: "POST",
  path: "/api/links/request",
  summary: "Mail a sign-in link to a client's contact",
  params: nothing,
  query: nothing,
  body: z.strictObject({ email }),
  result: noContent,
  status: 202,
});

export const acceptInvitation = endpoint({
  method: "POST",
  path: "/api/invitations/accept",
  summary: "Join a shop by a mailed invitation",
  params: nothing,
  query: nothing,
  /** Name and password for someone new; a known person is signed in and sends neither. */
  body: z.strictObject({ token, name: personName.optional(), password: password.optional() }),
  result: z.strictObject({ shop: shopSlug, email: z.string() }),
});

export const forgotPassword = endpoint({
  method: "POST",
  path: "/api/password/forgot",
  summary: "Mail a link that sets a new password",
  params: nothing,
  query: nothing,
  body: z.strictObject({ email }),
  result: noContent,
  status: 202,
});

export const resetPassword = endpoint({
  method: "POST",
  path: "/api/password/reset",
  summary: "Set a new password by a mailed link; ends every other session",
  params: nothing,
  query: nothing,
  body: z.strictObject({ token, password }),
  result: z.strictObject({ email: z.string() }),
});

export const changeAccount = endpoint({
  method: "PATCH",
  path: "/api/account",
  summary: "Change one's own name",
  params: nothing,
  query: nothing,
  body: z.strictObject({ name: personName }),
  result: meSchema,
});

export const changePassword = endpoint({
  method: "POST",
  path: "/api/account/password",
  summary: "Change one's password; ends every other session",
  params: nothing,
  query: nothing,
  body: z.strictObject({ current: z.string().max(200), password }),
  result: noContent,
  status: 204,
});

export const sessionSchema = z.strictObject({
  id: z.uuid(),
  began: z.enum(["password", "link"]),
  createdAt: instant,
  lastSeenAt: instant,
  agent: z.string(),
  current: z.boolean(),
});

export const listSessions = endpoint({
  method: "GET",
  path: "/api/account/sessions",
  summary: "Where one is signed in",
  params: nothing,
  query: nothing,
  body: nothing,
  result: z.strictObject({ items: z.array(sessionSchema) }),
});

export const endSession = endpoint({
  method: "DELETE",
  path: "/api/account/sessions/:sessionId",
  summary: "End one session at once",
  params: z.strictObject({ sessionId: z.uuid() }),
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});
