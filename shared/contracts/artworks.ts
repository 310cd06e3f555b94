import { z } from "zod";
import { pathSchema } from "../mockup/schema-parts.ts";
import { inShop, instant, lengthMm, noContent, nothing, pageOf, pageQuery, sha256 } from "./common.ts";
import { endpoint } from "./endpoint.ts";

const box = z.strictObject({ x: z.number(), y: z.number(), width: z.number(), height: z.number() });

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
  refusal: z.strictObject({ code: z.string(), text: z.string() }).nullable(),
  can: z.strictObject({ change: z.boolean(), remove: z.boolean() }),
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
