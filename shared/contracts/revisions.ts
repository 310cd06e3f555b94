import { z } from "zod";
import type { DisplayList } from "../drawing/display-list.ts";
import type { Finding } from "../dry-fit/finding.ts";
import { revisionStates } from "../lifecycle/revision-states.ts";
import type { Change } from "../mockup/changes.ts";
import { addresses } from "./addresses.ts";
import { inShop, instant, noContent, nothing, pageOf, pageQuery, personName, sha256, writtenText } from "./common.ts";
import { endpoint } from "./endpoint.ts";

export const revisionState = z.enum(revisionStates);

export const decisionSchema = z.strictObject({
  kind: z.enum(["approved", "revision asked"]),
  by: z.string(),
  typedName: z.string().nullable(),
  summary: z.string(),
  at: instant,
  hasCertificate: z.boolean(),
});

export const revisionSchema = z.strictObject({
  id: z.uuid(),
  jobId: z.uuid(),
  letter: z.string(),
  state: revisionState,
  message: z.string(),
  issuedAt: instant.nullable(),
  issuedBy: z.string(),
  snapshotSha256: sha256.nullable(),
  pdfSha256: sha256.nullable(),
  pdfByteSize: z.number().int().nullable(),
  /** Why the last try to make the PDF failed, when it did. */
  failure: z.string().nullable(),
  decision: decisionSchema.nullable(),
  /** The letter now out, when this one is not it. */
  current: z.strictObject({ revisionId: z.uuid(), letter: z.string() }).nullable(),
  can: z.strictObject({ note: z.boolean(), decide: z.boolean(), withdraw: z.boolean(), download: z.boolean() }),
});
export type Revision = z.infer<typeof revisionSchema>;

/** Drawn by our own engine when the revision was issued, so it is passed on without being taken apart again. */
const displayList = z.custom<DisplayList>((value) => typeof value === "object" && value !== null && "items" in value);

const zoneField = z.strictObject({ label: z.string(), fromMm: z.number(), toMm: z.number() });

export const sheetSchema = z.strictObject({
  revision: revisionSchema,
  job: z.strictObject({
    id: z.uuid(),
    number: z.string(),
    title: z.string(),
    client: z.string(),
    shopName: z.string(),
    unit: z.enum(["mm", "in"]),
  }),
  /** Who the page thinks the reader is. */
  reader: z.strictObject({ name: z.string(), side: z.enum(["shop", "client"]), approver: z.boolean() }),
  elevation: displayList,
  section: displayList,
  schedule: z.array(
    z.strictObject({
      key: z.string(),
      what: z.string(),
      stock: z.string(),
      thickness: z.string(),
      heldBy: z.string(),
      offset: z.string(),
      topAt: z.string(),
      pieces: z.string(),
      mass: z.string(),
    }),
  ),
  /** The board in mm, its frame included, and where each piece lies, so that a note can be pinned by choosing a piece from the list. */
  board: z.strictObject({ widthMm: z.number(), heightMm: z.number() }),
  pieces: z.array(
    z.strictObject({ id: z.string(), name: z.string(), layerKey: z.string(), x: z.number(), y: z.number() }),
  ),
  figures: z.strictObject({ massG: z.number(), depthMm: z.number(), offWallMm: z.number() }),
  /** How it hangs and how long its finish dries: the shop's own business, null for a client. */
  making: z.string().nullable(),
  /** The zones of the paper sheet in mm of the board, so that the screen's frame says the same as the PDF. */
  zones: z.strictObject({ columns: z.array(zoneField), rows: z.array(zoneField) }),
  words: z.string(),
  acknowledgements: z.array(z.strictObject({ id: z.string(), text: z.string() })),
  others: z.array(z.strictObject({ revisionId: z.uuid(), letter: z.string(), state: revisionState })),
});
export type SheetView = z.infer<typeof sheetSchema>;

const oneJob = inShop.extend({ jobId: z.uuid() });
const oneRevision = inShop.extend({ revisionId: z.uuid() });

export const listRevisions = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/revisions",
  summary: "Revisions of a job, newest first",
  params: oneJob,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(revisionSchema),
});
/** Freezes the saved draft of that very version. The answer is `preparing`; it is `issued` once its PDF stands. */
export const issueRevision = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs/:jobId/revisions",
  summary: "Issue the draft as the next revision",
  params: oneJob,
  query: nothing,
  body: z.strictObject({ mockupVersion: z.number().int().min(1), message: writtenText(2000).default("") }),
  result: revisionSchema,
  status: 202,
});
export const getRevision = endpoint({
  ...addresses.getRevision,
  summary: "One revision",
  params: oneRevision,
  query: nothing,
  body: nothing,
  result: revisionSchema,
});
export const getSheet = endpoint({
  ...addresses.getSheet,
  summary: "The sheet of a revision",
  params: oneRevision,
  query: nothing,
  body: nothing,
  result: sheetSchema,
});
export const getProof = endpoint({
  ...addresses.getProof,
  summary: "The issued PDF",
  params: oneRevision,
  query: nothing,
  body: nothing,
  result: noContent,
  form: "file",
});
export const getCertificate = endpoint({
  ...addresses.getCertificate,
  summary: "The certificate of approval",
  params: oneRevision,
  query: nothing,
  body: nothing,
  result: noContent,
  form: "file",
});
/** The sign on its wall as SVG, for lists. */
export const getPicture = endpoint({
  method: "GET",
  path: "/api/shops/:shop/revisions/:revisionId/picture.svg",
  summary: "The sign of a revision as a small picture",
  params: oneRevision,
  query: nothing,
  body: nothing,
  result: noContent,
  form: "file",
});
export const withdrawRevision = endpoint({
  method: "POST",
  path: "/api/shops/:shop/revisions/:revisionId/withdraw",
  summary: "Withdraw an issued revision",
  params: oneRevision,
  query: nothing,
  body: z.strictObject({ reason: writtenText(400).refine((text) => text.length > 0, "Say why it is withdrawn.") }),
  result: revisionSchema,
});
export const approveRevision = endpoint({
  ...addresses.approveRevision,
  summary: "Approve this very PDF",
  params: oneRevision,
  query: nothing,
  body: z.strictObject({
    typedName: personName,
    acknowledgedIds: z.array(z.string().max(40)).max(40),
    /** Hash of the PDF the reader was shown. */
    pdfSha256: sha256,
    settledNoteIds: z.array(z.uuid()).max(500).default([]),
    consentToPortfolio: z.boolean().default(false),
  }),
  result: revisionSchema,
});
export const askForRevision = endpoint({
  ...addresses.askForRevision,
  summary: "Ask for a revision: needs an open note or a summary",
  params: oneRevision,
  query: nothing,
  body: z.strictObject({ summary: writtenText(2000).default("") }),
  result: revisionSchema,
});

const change = z.custom<Change>((value) => typeof value === "object" && value !== null && "text" in value);
export const compareSchema = z.strictObject({
  before: z.strictObject({ revision: revisionSchema, elevation: displayList, section: displayList }),
  after: z.strictObject({ revision: revisionSchema, elevation: displayList, section: displayList }),
  changes: z.array(change),
});
export const compareRevisions = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/compare",
  summary: "Two revisions side by side and what changed, in words",
  params: oneJob,
  query: z.strictObject({ before: z.uuid(), after: z.uuid() }),
  body: nothing,
  result: compareSchema,
});

const finding = z.custom<Finding>((value) => typeof value === "object" && value !== null && "rule" in value);
export const dryFitSchema = z.strictObject({ findings: z.array(finding) });
