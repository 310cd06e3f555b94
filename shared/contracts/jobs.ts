import { z } from "zod";
import { jobStates, staffStates } from "../lifecycle/job-states.ts";
import { leastBoardMm } from "../mockup/schema-parts.ts";
import { day, inShop, instant, nothing, pageOf, pageQuery, writtenLine, writtenText } from "./common.ts";
import { endpoint } from "./endpoint.ts";

export const jobState = z.enum(jobStates);
export const move = z.enum(["ours", "client", "nobody"]);

const signSide = z
  .number()
  .finite()
  .min(leastBoardMm, `A sign is at least ${leastBoardMm} mm (13/16 inch) wide and high.`)
  .max(10_000, "At most 10 m (32 feet).");
const howMany = "Write a whole number from 1 to 1000.";

/** What the sign is to be. Every field may be missing until the brief is complete. */
export const briefSchema = z.strictObject({
  widthMm: signSide.nullable(),
  heightMm: signSide.nullable(),
  place: z.enum(["inside", "outside"]).nullable(),
  wall: writtenText(400),
  viewingDistanceMm: z
    .number()
    .finite()
    .positive("Write a distance over 0.")
    .max(200_000, "At most 200 m (656 feet).")
    .nullable(),
  lighting: writtenText(400),
  quantity: z.number(howMany).int(howMany).min(1, howMany).max(1000, howMany),
  brandColours: writtenText(400),
  about: writtenText(2000),
  /** What asks for more than a drawing: people pass within reach, stand under it, or it has lights and wires. */
  walkway: z.boolean(),
  overhead: z.boolean(),
  electrical: z.boolean(),
  /** The words exactly as they shall read, a line a line. */
  words: writtenText(1000),
});
export type Brief = z.infer<typeof briefSchema>;

/** What a job begins with. */
export const emptyBrief: Brief = {
  widthMm: null,
  heightMm: null,
  place: null,
  wall: "",
  viewingDistanceMm: null,
  lighting: "",
  quantity: 1,
  brandColours: "",
  about: "",
  walkway: false,
  overhead: false,
  electrical: false,
  words: "",
};

const title = writtenLine(160, "Say what the sign is.");

export const jobSchema = z.strictObject({
  id: z.uuid(),
  number: z.string(),
  title: z.string(),
  state: jobState,
  whoseMove: move,
  /** One sentence: what is to be done next. */
  nextStep: z.string(),
  client: z.strictObject({ id: z.uuid(), name: z.string() }),
  dueOn: day.nullable(),
  brief: briefSchema,
  briefMissing: z.array(z.string()),
  approvers: z.array(z.strictObject({ contactId: z.uuid(), name: z.string() })),
  /** Newest letter that the reader may see, with its state. */
  latest: z.strictObject({ revisionId: z.uuid(), letter: z.string(), state: z.string() }).nullable(),
  approved: z.strictObject({ revisionId: z.uuid(), letter: z.string() }).nullable(),
  openNotes: z.number().int(),
  consent: z.strictObject({ given: z.boolean(), at: instant.nullable() }),
  lastEvent: z.strictObject({ text: z.string(), at: instant }).nullable(),
  createdAt: instant,
  can: z.strictObject({
    editBrief: z.boolean(),
    editMockup: z.boolean(),
    seeMockup: z.boolean(),
    issue: z.boolean(),
    move: z.boolean(),
    seeShopOnly: z.boolean(),
    giveConsent: z.boolean(),
    share: z.boolean(),
  }),
});
export type Job = z.infer<typeof jobSchema>;

/** A row of the Bench: a job without its brief. */
export const benchRowSchema = jobSchema.omit({
  brief: true,
  briefMissing: true,
  approvers: true,
  can: true,
  consent: true,
  createdAt: true,
});
export type BenchRow = z.infer<typeof benchRowSchema>;

const oneJob = inShop.extend({ jobId: z.uuid() });

export const listJobs = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs",
  summary: "Jobs, those with an open move first, then by due day",
  params: inShop,
  query: z.strictObject({
    ...pageQuery,
    q: z.string().max(200).optional(),
    whoseMove: move.optional(),
    state: jobState.optional(),
    clientId: z.uuid().optional(),
    sort: z.enum(["due", "number", "newest"]).default("due"),
  }),
  body: nothing,
  result: pageOf(benchRowSchema).extend({
    counts: z.strictObject({ ours: z.number().int(), client: z.number().int(), nobody: z.number().int() }),
  }),
});
export const getJob = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId",
  summary: "One job",
  params: oneJob,
  query: nothing,
  body: nothing,
  result: jobSchema,
});
export const openJob = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs",
  summary: "Open a job for a client",
  params: inShop,
  query: nothing,
  body: z.strictObject({ clientId: z.uuid(), title, dueOn: day.nullable().default(null) }),
  result: jobSchema,
  status: 201,
});
export const changeJob = endpoint({
  method: "PATCH",
  path: "/api/shops/:shop/jobs/:jobId",
  summary: "Change title, due day, brief or approvers",
  params: oneJob,
  query: nothing,
  body: z.strictObject({
    title: title.optional(),
    dueOn: day.nullable().optional(),
    brief: briefSchema.partial().optional(),
    approverIds: z.array(z.uuid()).max(20).optional(),
  }),
  result: jobSchema,
});
export const moveJob = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs/:jobId/state",
  summary: "Move a job on after approval, hold it, take it up again or cancel it",
  params: oneJob,
  query: nothing,
  body: z.strictObject({
    to: z.enum([...staffStates, "taken up again"]),
    reason: writtenText(400).default(""),
  }),
  result: jobSchema,
});
export const setConsent = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs/:jobId/consent",
  summary: "The client lets the shop show the piece in its portfolio, or takes that back",
  params: oneJob,
  query: nothing,
  body: z.strictObject({ given: z.boolean() }),
  result: jobSchema,
});

export const eventSchema = z.strictObject({
  id: z.string(),
  at: instant,
  who: z.string(),
  text: z.string(),
  kind: z.string(),
});
export const listEvents = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/events",
  summary: "The job's log, newest first",
  params: oneJob,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(eventSchema),
});
