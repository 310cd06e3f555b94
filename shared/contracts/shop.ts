import { z } from "zod";
import { isTimeZone } from "../lifecycle/reminder-due.ts";
import { role } from "./account.ts";
import { addresses } from "./addresses.ts";
import { email, inShop, instant, noContent, nothing, pageOf, pageQuery, shopSlug, writtenLine } from "./common.ts";
import { endpoint } from "./endpoint.ts";

export const lengthUnit = z.enum(["mm", "in"]);

const howManyDays = "Write a whole number of days from 0 to 60.";
const leadDays = z.number(howManyDays).int(howManyDays).min(0, howManyDays).max(60, howManyDays);

export const shopSchema = z.strictObject({
  slug: shopSlug,
  name: z.string(),
  unit: lengthUnit,
  /** As CL in CL-0142. */
  jobPrefix: z.string(),
  paper: z.enum(["A4", "A3", "Letter", "Tabloid"]),
  /** What counts back from a due day to the day a yes is needed by. */
  timeZone: z.string(),
  buildDays: z.number().int(),
  freightDays: z.number().int(),
  demo: z.boolean(),
  can: z.strictObject({
    changeShop: z.boolean(),
    manageTeam: z.boolean(),
    openJob: z.boolean(),
    seeClients: z.boolean(),
    seeStock: z.boolean(),
    changeStock: z.boolean(),
    seePrices: z.boolean(),
    seePortfolio: z.boolean(),
    sharePortfolio: z.boolean(),
    seeOutgoingMail: z.boolean(),
  }),
});
export type Shop = z.infer<typeof shopSchema>;

export const getShop = endpoint({
  ...addresses.getShop,
  summary: "The shop as the reader sees it",
  params: inShop,
  query: nothing,
  body: nothing,
  result: shopSchema,
});

export const changeShop = endpoint({
  method: "PATCH",
  path: "/api/shops/:shop",
  summary: "Change the shop's name, unit, numbering, paper and lead time",
  params: inShop,
  query: nothing,
  body: z.strictObject({
    name: writtenLine(120, "Write the shop's name.").optional(),
    unit: lengthUnit.optional(),
    jobPrefix: z
      .string()
      .regex(/^[A-Z]{1,4}$/, "One to four capital letters.")
      .optional(),
    paper: z.enum(["A4", "A3", "Letter", "Tabloid"]).optional(),
    timeZone: z.string().max(60).refine(isTimeZone, "Write a zone by its name, like Europe/Vienna.").optional(),
    buildDays: leadDays.optional(),
    freightDays: leadDays.optional(),
  }),
  result: shopSchema,
});

export const memberSchema = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  role,
  since: instant,
  isYou: z.boolean(),
  can: z.strictObject({ changeRole: z.boolean(), remove: z.boolean() }),
});
export const invitationSchema = z.strictObject({
  id: z.uuid(),
  email: z.string(),
  role,
  sentAt: instant,
  by: z.string(),
});

export const listMembers = endpoint({
  method: "GET",
  path: "/api/shops/:shop/members",
  summary: "The team",
  params: inShop,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(memberSchema),
});
export const listInvitations = endpoint({
  method: "GET",
  path: "/api/shops/:shop/invitations",
  summary: "Invitations not yet accepted",
  params: inShop,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(invitationSchema),
});
export const inviteMember = endpoint({
  method: "POST",
  path: "/api/shops/:shop/invitations",
  summary: "Invite a member by mail; inviting the same address again sends a fresh link",
  params: inShop,
  query: nothing,
  body: z.strictObject({ email, role }),
  result: invitationSchema,
  status: 201,
});
export const revokeInvitation = endpoint({
  method: "DELETE",
  path: "/api/shops/:shop/invitations/:invitationId",
  summary: "Take an invitation back",
  params: inShop.extend({ invitationId: z.uuid() }),
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});
export const changeMember = endpoint({
  method: "PATCH",
  path: "/api/shops/:shop/members/:memberId",
  summary: "Change a member's role",
  params: inShop.extend({ memberId: z.uuid() }),
  query: nothing,
  body: z.strictObject({ role }),
  result: memberSchema,
});
export const removeMember = endpoint({
  method: "DELETE",
  path: "/api/shops/:shop/members/:memberId",
  summary: "Remove a member; their sessions end at once. The last owner stays.",
  params: inShop.extend({ memberId: z.uuid() }),
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});
