import { z } from "zod";
import { pathSchema } from "../mockup/schema-parts.ts";
import { traceChoices } from "../tracing/trace-choices.ts";
import { inShop, instant, lengthMm, noContent, nothing, pageOf, pageQuery, sha256 } from "./common.ts";
import { endpoint } from "./endpoint.ts";

const box = z.strictObject({ x: z.number(), y: z.number(), width: z.number(), height: z.number() });

const reason = z.strictObject({ code: z.string(), text: z.string() });

/** How a picture became pieces. Sizes in pixels as the file has them and as they were traced. */
const traceRecord = z.strictObject({
  choices: traceChoices,
  widthPx: z.number().int(),
  heightPx: z.number().int(),
  tracedWidthPx: z.number().int(),
  tracedHeightPx: z.number().int(),
  found: z.array(
    z.strictObject({
      colour: z.string(),
      share: z.number(),
      fillsRim: z.boolean(),
      became: z.enum(["pieces", "joined", "dropped"]),
    }),
  ),
  nodes: z.number().int(),
  smallestMm2: z.number(),
});

export const artworkSchema = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  state: z.enum(["importing", "ready", "refused"]),
  sha256,
  byteSize: z.number().int(),
  addedAt: instant,
  addedBy: z.string(),
  /** Ready: size in mm after the true size was chosen, and what stands out. */
  widthMm: z.number().nullable(),
  heightMm: z.number().nullable(),
  colours: z.array(z.strictObject({ colour: z.string(), pieces: z.number().int(), areaMm2: z.number() })),
  warnings: z.array(z.strictObject({ code: z.string(), text: z.string() })),
  refusal: reason.nullable(),
  /** Of a picture: how its pieces came to be, what it is being traced again with, and why that failed the last time. */
  trace: z
    .strictObject({ record: traceRecord.nullable(), asked: traceChoices.nullable(), failure: reason.nullable() })
    .nullable(),
  can: z.strictObject({ change: z.boolean(), remove: z.boolean(), trace: z.boolean() }),
});
export type Artwork = z.infer<typeof artworkSchema>;

export const artworkPieces = z.strictObject({
  id: z.uuid(),
  widthMm: z.number(),
  heightMm: z.number(),
  pieces: z.array(
    z.strictObject({ index: z.number().int(), colour: z.string(), path: pathSchema, box, areaMm2: z.number() }),
  ),
});

const oneJob = inShop.extend({ jobId: z.uuid() });
const oneArtwork = inShop.extend({ artworkId: z.uuid() });

export const listArtworks = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/artworks",
  summary: "Artwork of a job",
  params: oneJob,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(artworkSchema),
});
/** One file in the field `file`. Answers when the file is kept; it is turned into pieces after that. */
export const addArtwork = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs/:jobId/artworks",
  summary: "Bring in an artwork file",
  params: oneJob,
  query: nothing,
  body: nothing,
  result: artworkSchema,
  form: "multipart",
  status: 202,
});
export const getArtwork = endpoint({
  method: "GET",
  path: "/api/shops/:shop/artworks/:artworkId",
  summary: "One artwork",
  params: oneArtwork,
  query: nothing,
  body: nothing,
  result: artworkSchema,
});
/** Pieces at the true size, in mm. */
export const getArtworkPieces = endpoint({
  method: "GET",
  path: "/api/shops/:shop/artworks/:artworkId/pieces",
  summary: "The pieces an artwork became",
  params: oneArtwork,
  query: nothing,
  body: nothing,
  result: artworkPieces,
});
export const getArtworkFile = endpoint({
  method: "GET",
  path: "/api/shops/:shop/artworks/:artworkId/file",
  summary: "The file as it came",
  params: oneArtwork,
  query: nothing,
  body: nothing,
  result: noContent,
  form: "file",
});
export const setTrueSize = endpoint({
  method: "PATCH",
  path: "/api/shops/:shop/artworks/:artworkId",
  summary: "Choose the true size by one dimension",
  params: oneArtwork,
  query: nothing,
  body: z.strictObject({ side: z.enum(["width", "height"]), lengthMm }),
  result: artworkSchema,
});
/** Answers when it is asked for; the pieces stay what they were until it is done, and when it fails. */
export const traceArtwork = endpoint({
  method: "POST",
  path: "/api/shops/:shop/artworks/:artworkId/trace",
  summary: "Trace a picture again with other choices",
  params: oneArtwork,
  query: nothing,
  body: traceChoices,
  result: artworkSchema,
  status: 202,
});
export const cancelTrace = endpoint({
  method: "DELETE",
  path: "/api/shops/:shop/artworks/:artworkId/trace",
  summary: "Give up tracing again and keep the pieces",
  params: oneArtwork,
  query: nothing,
  body: nothing,
  result: artworkSchema,
});
export const removeArtwork = endpoint({
  method: "DELETE",
  path: "/api/shops/:shop/artworks/:artworkId",
  summary: "Take an artwork off the job; what was issued keeps it",
  params: oneArtwork,
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});
