import { z } from "zod";
import { day, inShop, nothing } from "./common.ts";
import { endpoint } from "./endpoint.ts";
import { briefSchema, jobSchema, openJob } from "./jobs.ts";

/**
 * Opens a job of the same format, stack and hardware as an earlier one, with new words. `artwork` takes the artwork and what
 * follows its outlines along, for the same client only.
 */
export const openAnotherLike = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs/:jobId/another",
  summary: "Open another job like this one",
  params: inShop.extend({ jobId: z.uuid() }),
  query: nothing,
  body: z.strictObject({
    clientId: z.uuid(),
    title: openJob.body.shape.title,
    dueOn: day.nullable().default(null),
    words: briefSchema.shape.words.default(""),
    artwork: z.boolean().default(false),
  }),
  result: jobSchema,
  status: 201,
});
