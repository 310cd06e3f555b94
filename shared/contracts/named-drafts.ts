import { z } from "zod";
import { documentSchema } from "../mockup/document.ts";
import { inShop, instant, noContent, nothing, pageOf, pageQuery, writtenLine } from "./common.ts";
import { endpoint } from "./endpoint.ts";

/** How many drafts a job keeps, and how much they hold together, in bytes of their stored text. */
export const mostDrafts = 100;
export const mostDraftBytes = 64 * 1024 * 1024;

/** A state of the mockup that somebody kept under a name, to return to. */
export const namedDraftSchema = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  keptBy: z.string(),
  keptAt: instant,
  can: z.strictObject({ change: z.boolean() }),
});
export type NamedDraft = z.output<typeof namedDraftSchema>;

const withDocument = namedDraftSchema.extend({ document: documentSchema });
export type NamedDraftWithDocument = z.output<typeof withDocument>;

const name = writtenLine(80, "Give the draft a name.");
const oneJob = inShop.extend({ jobId: z.uuid() });
const oneDraft = oneJob.extend({ draftId: z.uuid() });

export const listDrafts = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/drafts",
  summary: "Drafts of a job's mockup that were kept under a name, newest first",
  params: oneJob,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(namedDraftSchema),
});
/** The document is what is on the desk, saved or not. A name is used once among a job's drafts, whatever its capitals. */
export const keepDraft = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs/:jobId/drafts",
  summary: "Keep a mockup as a draft with a name",
  params: oneJob,
  query: nothing,
  body: z.strictObject({ name, document: documentSchema }),
  result: namedDraftSchema,
  status: 201,
});
/** The document in today's version. */
export const getDraft = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/drafts/:draftId",
  summary: "One draft with its document",
  params: oneDraft,
  query: nothing,
  body: nothing,
  result: withDocument,
});
export const renameDraft = endpoint({
  method: "PATCH",
  path: "/api/shops/:shop/jobs/:jobId/drafts/:draftId",
  summary: "Give a draft another name",
  params: oneDraft,
  query: nothing,
  body: z.strictObject({ name }),
  result: namedDraftSchema,
});
export const removeDraft = endpoint({
  method: "DELETE",
  path: "/api/shops/:shop/jobs/:jobId/drafts/:draftId",
  summary: "Remove a draft for good",
  params: oneDraft,
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});
