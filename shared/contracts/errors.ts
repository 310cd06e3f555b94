import { z } from "zod";
import { type ErrorCode, errorCodes } from "./error-codes.ts";

/** RFC 9457 problem document. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  code: z.enum(Object.keys(errorCodes) as [ErrorCode, ...ErrorCode[]]),
  detail: z.string().optional(),
  errors: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional(),
  instance: z.string().optional(),
  requestId: z.string().optional(),
  /** What the reader needs to go on, as the newer version after `stale` or the current letter after `wrong_state`. */
  extra: z.record(z.string(), z.unknown()).optional(),
});
export type Problem = z.infer<typeof problemSchema>;
