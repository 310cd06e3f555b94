import { z } from "zod";
import {
  email,
  inShop,
  instant,
  noContent,
  nothing,
  pageOf,
  pageQuery,
  personName,
  writtenLine,
  writtenText,
} from "./common.ts";
import { endpoint } from "./endpoint.ts";

const clientName = writtenLine(160, "Write the client's name.");

export const contactSchema = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  lastSeenAt: instant.nullable(),
});
export const clientSchema = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  remarks: z.string(),
  contacts: z.array(contactSchema),
  openJobs: z.number().int(),
  can: z.strictObject({ change: z.boolean() }),
});
export type Client = z.infer<typeof clientSchema>;

const oneClient = inShop.extend({ clientId: z.uuid() });
const oneContact = inShop.extend({ contactId: z.uuid() });

export const listClients = endpoint({
  method: "GET",
  path: "/api/shops/:shop/clients",
  summary: "Clients by name",
  params: inShop,
  query: z.strictObject({ ...pageQuery, q: z.string().max(200).optional() }),
  body: nothing,
  result: pageOf(clientSchema),
});
export const getClient = endpoint({
  method: "GET",
  path: "/api/shops/:shop/clients/:clientId",
  summary: "One client with contacts",
  params: oneClient,
  query: nothing,
  body: nothing,
  result: clientSchema,
});
export const addClient = endpoint({
  method: "POST",
  path: "/api/shops/:shop/clients",
  summary: "Add a client",
  params: inShop,
  query: nothing,
  body: z.strictObject({ name: clientName, remarks: writtenText(2000).default("") }),
  result: clientSchema,
  status: 201,
});
export const changeClient = endpoint({
  method: "PATCH",
  path: "/api/shops/:shop/clients/:clientId",
  summary: "Change a client's name or remarks",
  params: oneClient,
  query: nothing,
  body: z.strictObject({ name: clientName.optional(), remarks: writtenText(2000).optional() }),
  result: clientSchema,
});
export const addContact = endpoint({
  method: "POST",
  path: "/api/shops/:shop/clients/:clientId/contacts",
  summary: "Add a contact",
  params: oneClient,
  query: nothing,
  body: z.strictObject({ name: personName, email }),
  result: contactSchema,
  status: 201,
});
export const changeContact = endpoint({
  method: "PATCH",
  path: "/api/shops/:shop/contacts/:contactId",
  summary: "Change a contact. A new address signs the contact out, kills open links and tells the old address.",
  params: oneContact,
  query: nothing,
  body: z.strictObject({ name: personName.optional(), email: email.optional() }),
  result: contactSchema,
});
export const removeContact = endpoint({
  method: "DELETE",
  path: "/api/shops/:shop/contacts/:contactId",
  summary: "End a contact's access at once",
  params: oneContact,
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});
export const inviteContact = endpoint({
  method: "POST",
  path: "/api/shops/:shop/contacts/:contactId/link",
  summary: "Mail the contact a sign-in link",
  params: oneContact,
  query: nothing,
  body: nothing,
  result: noContent,
  status: 202,
});
