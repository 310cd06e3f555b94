import { z } from "zod";
import { addresses } from "./addresses.ts";
import { inShop, noContent, nothing } from "./common.ts";
import { endpoint } from "./endpoint.ts";

export const signalKinds = ["note", "revision", "mockup", "job"] as const;
export type SignalKind = (typeof signalKinds)[number];

/** What of a job changed. What it is now, the reader asks for as always. */
export const jobSignalSchema = z.strictObject({ kind: z.enum(signalKinds), id: z.uuid() });
export type JobSignal = z.infer<typeof jobSignalSchema>;

/**
 * Server-sent events (WHATWG HTML, section 9.2): `signal` with a JobSignal as its data and its number as its id, from the one after
 * `after` or the `Last-Event-ID` header on; `begun` first, with the number from which it goes on. `once` ends after those that are there.
 */
export const streamJobSignals = endpoint({
  ...addresses.streamJobSignals,
  summary: "What changes on a job, as it changes",
  params: inShop.extend({ jobId: z.uuid() }),
  query: z.strictObject({
    after: z.coerce.number().int().min(0).optional(),
    once: z.literal("1").optional(),
  }),
  body: nothing,
  result: noContent,
  form: "stream",
});
