import { z } from "zod";
import { documentSchema } from "../mockup/document.ts";
import { inShop, nothing } from "./common.ts";
import { endpoint } from "./endpoint.ts";
import { revisionState } from "./revisions.ts";

export const revisionDocumentSchema = z.strictObject({
  revisionId: z.uuid(),
  letter: z.string(),
  state: revisionState,
  /** What was frozen, in today's version of the document. */
  document: documentSchema,
});
export type RevisionDocument = z.infer<typeof revisionDocumentSchema>;

export const getRevisionDocument = endpoint({
  method: "GET",
  path: "/api/shops/:shop/revisions/:revisionId/document",
  summary: "The mockup that a revision froze, for the shop that builds from it",
  params: inShop.extend({ revisionId: z.uuid() }),
  query: nothing,
  body: nothing,
  result: revisionDocumentSchema,
});
