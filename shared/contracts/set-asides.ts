import { z } from "zod";
import type { BoundFinding } from "../dry-fit/set-aside.ts";
import { inShop, instant, noContent, nothing, pageOf, pageQuery, writtenText } from "./common.ts";
import { endpoint } from "./endpoint.ts";

const number = z.number().finite();

/** A finding of the dry fit without its spot and its source. `text` binds it only where nothing was measured. */
export const boundFindingSchema: z.ZodType<BoundFinding, BoundFinding> = z.strictObject({
  rule: z.int().min(1).max(1000),
  title: z.string().max(200),
  severity: z.enum(["stop", "caution", "remark"]),
  text: z.string().max(20_000),
  layerKey: z.string().max(2).nullable(),
  pieceIds: z.array(z.string().max(64)).max(10_000),
  holeId: z.string().max(64).nullable(),
  value: number.nullable(),
  limit: number.nullable(),
  unit: z.string().max(20).nullable(),
});

export const setAsideSchema = z.strictObject({
  id: z.uuid(),
  finding: boundFindingSchema,
  reason: z.string(),
  by: z.string(),
  at: instant,
  can: z.strictObject({ takeBack: z.boolean() }),
});
export type SetAside = z.output<typeof setAsideSchema>;

const oneJob = inShop.extend({ jobId: z.uuid() });
export const longestReason = 500;
const reason = writtenText(longestReason).refine((text) => [...text].length >= 3, "Say why, in a few words.");

export const listSetAsides = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/set-asides",
  summary: "Findings of a job's dry fit that are set aside, newest first",
  params: oneJob,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(setAsideSchema),
});
/**
 * The dry fit of that saved version is worked out anew, and the finding must be among what it finds. Safety stops are
 * set aside by owners only.
 */
export const setAsideFinding = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs/:jobId/set-asides",
  summary: "Set a finding of the saved draft aside, with a reason",
  params: oneJob,
  query: nothing,
  body: z.strictObject({ mockupVersion: z.number().int().min(1), finding: boundFindingSchema, reason }),
  result: setAsideSchema,
  status: 201,
});
export const takeBackSetAside = endpoint({
  method: "DELETE",
  path: "/api/shops/:shop/jobs/:jobId/set-asides/:setAsideId",
  summary: "Take a set-aside back: its finding stands again",
  params: oneJob.extend({ setAsideId: z.uuid() }),
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});
