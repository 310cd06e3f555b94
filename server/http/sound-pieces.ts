import type { RequestHandler } from "express";
import { badPlaces } from "#shared/mockup/bad-places.ts";
import { invalid } from "./app-error.ts";

/** Nobody mends more by hand: a document with so many was never drawn here. */
const most = 1000;

/** Refuses a posted mockup that is nonsense before the schema takes seconds and gigabytes to say so in detail. */
export const soundPieces: RequestHandler = (request, _response, next) => {
  const body: unknown = request.body;
  const document = typeof body === "object" && body !== null && "document" in body ? body.document : null;
  if (badPlaces(document, most) < most) return next();
  next(invalid([{ pointer: "/document", detail: "This is no mockup: its pieces can't be read." }]));
};
