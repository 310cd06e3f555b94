import { z } from "zod";
import { documentSchema } from "../mockup/document.ts";
import { inShop, instant, nothing } from "./common.ts";
import { endpoint } from "./endpoint.ts";

export const mockupSchema = z.strictObject({
  /** 0 before the first save: the document is then an empty board of the brief's size. */
  version: z.number().int().min(0),
  document: documentSchema,
  savedAt: instant.nullable(),
  savedBy: z.string().nullable(),
  can: z.strictObject({ edit: z.boolean(), issue: z.boolean() }),
});
export type Mockup = z.infer<typeof mockupSchema>;

const oneJob = inShop.extend({ jobId: z.uuid() });

export const getMockup = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/mockup",
  summary: "The draft of a job",
  params: oneJob,
  query: nothing,
  body: nothing,
  result: mockupSchema,
});
/** `version` is the one the edit began from. A newer one answers `stale` with the newer mockup in `extra.newer`. */
export const saveMockup = endpoint({
  method: "PUT",
  path: "/api/shops/:shop/jobs/:jobId/mockup",
  summary: "Save the draft",
  params: oneJob,
  query: nothing,
  body: z.strictObject({ version: z.number().int().min(0), document: documentSchema }),
  result: mockupSchema,
});
