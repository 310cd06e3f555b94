import type { Endpoint } from "./endpoint.ts";

/**
 * Where the requests go that the page of a sheet makes. Apart from the contracts, so that a client's phone fetches the sheet without the
 * schemas of what they carry; the contracts take them from here.
 */
export const addresses = {
  whoAmI: { method: "GET", path: "/api/me" },
  getShop: { method: "GET", path: "/api/shops/:shop" },
  getRevision: { method: "GET", path: "/api/shops/:shop/revisions/:revisionId" },
  getSheet: { method: "GET", path: "/api/shops/:shop/revisions/:revisionId/sheet" },
  getProof: { method: "GET", path: "/api/shops/:shop/revisions/:revisionId/proof.pdf" },
  getCertificate: { method: "GET", path: "/api/shops/:shop/revisions/:revisionId/certificate.pdf" },
  approveRevision: { method: "POST", path: "/api/shops/:shop/revisions/:revisionId/approve" },
  askForRevision: { method: "POST", path: "/api/shops/:shop/revisions/:revisionId/ask" },
  listNotes: { method: "GET", path: "/api/shops/:shop/revisions/:revisionId/notes" },
  addNote: { method: "POST", path: "/api/shops/:shop/revisions/:revisionId/notes" },
  replyToNote: { method: "POST", path: "/api/shops/:shop/notes/:noteId/replies" },
  editNote: { method: "PATCH", path: "/api/shops/:shop/notes/:noteId" },
  editReply: { method: "PATCH", path: "/api/shops/:shop/notes/:noteId/replies/:replyId" },
  setNoteState: { method: "POST", path: "/api/shops/:shop/notes/:noteId/state" },
  streamJobSignals: { method: "GET", path: "/api/shops/:shop/jobs/:jobId/signals" },
} as const;

/** An address with the endpoint that is there, for the types of what it takes and answers. */
export type AddressOf<E extends Endpoint> = Pick<E, "method" | "path"> & { readonly of?: E };
