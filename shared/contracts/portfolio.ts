import { z } from "zod";
import type { DisplayList } from "../drawing/display-list.ts";
import { inShop, instant, noContent, nothing, pageOf, pageQuery, token, writtenLine } from "./common.ts";
import { endpoint } from "./endpoint.ts";

const displayList = z.custom<DisplayList>((value) => typeof value === "object" && value !== null && "items" in value);

/** An approved piece that may be shown once its client consents. */
export const portfolioPieceSchema = z.strictObject({
  jobId: z.uuid(),
  title: z.string(),
  client: z.string(),
  letter: z.string(),
  widthMm: z.number(),
  heightMm: z.number(),
  consent: z.boolean(),
  elevation: displayList,
});
export const shareLinkSchema = z.strictObject({
  id: z.uuid(),
  label: z.string(),
  pieces: z.array(z.strictObject({ jobId: z.uuid(), title: z.string() })),
  state: z.enum(["live", "expired", "revoked"]),
  createdAt: instant,
  createdBy: z.string(),
  expiresAt: instant,
  openings: z.number().int(),
  lastOpenedAt: instant.nullable(),
});

export const listPortfolioPieces = endpoint({
  method: "GET",
  path: "/api/shops/:shop/portfolio",
  summary: "Approved pieces and whether they may be shown",
  params: inShop,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(portfolioPieceSchema),
});
export const listShareLinks = endpoint({
  method: "GET",
  path: "/api/shops/:shop/share-links",
  summary: "Portfolio links",
  params: inShop,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(shareLinkSchema),
});
/** The address is shown this once: only its hash is kept. */
export const makeShareLink = endpoint({
  method: "POST",
  path: "/api/shops/:shop/share-links",
  summary: "Make a portfolio link",
  params: inShop,
  query: nothing,
  body: z.strictObject({
    label: writtenLine(120, "Say whom it is for."),
    jobIds: z.array(z.uuid()).min(1, "Choose a piece.").max(60),
    days: z.number().int().min(1).max(365).default(30),
  }),
  result: z.strictObject({ link: shareLinkSchema, url: z.string() }),
  status: 201,
});
export const revokeShareLink = endpoint({
  method: "DELETE",
  path: "/api/shops/:shop/share-links/:linkId",
  summary: "Close a portfolio link at once",
  params: inShop.extend({ linkId: z.uuid() }),
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});

/** What a guest sees: no client contact, note, cost or file. */
export const openShareLink = endpoint({
  method: "GET",
  path: "/api/share/:token",
  summary: "The pieces behind a portfolio link",
  params: z.strictObject({ token }),
  query: nothing,
  body: nothing,
  result: z.strictObject({
    shopName: z.string(),
    unit: z.enum(["mm", "in"]),
    pieces: z.array(
      z.strictObject({
        title: z.string(),
        client: z.string(),
        widthMm: z.number(),
        heightMm: z.number(),
        offWallMm: z.number(),
        materials: z.array(z.string()),
        elevation: displayList,
        section: displayList,
      }),
    ),
  }),
});
