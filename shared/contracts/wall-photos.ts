import { z } from "zod";
import { inShop, instant, noContent, nothing, pageOf, pageQuery, sha256 } from "./common.ts";
import { endpoint } from "./endpoint.ts";

export const wallPhotoItem = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  widthPx: z.number().int(),
  heightPx: z.number().int(),
  sha256,
  byteSize: z.number().int(),
  addedAt: instant,
  addedBy: z.string(),
  can: z.strictObject({ remove: z.boolean() }),
});
export type WallPhotoItem = z.infer<typeof wallPhotoItem>;

const oneJob = inShop.extend({ jobId: z.uuid() });
const onePhoto = inShop.extend({ photoId: z.uuid() });

export const listWallPhotos = endpoint({
  method: "GET",
  path: "/api/shops/:shop/jobs/:jobId/wall-photos",
  summary: "Photos of the wall that a job's sign is to hang on",
  params: oneJob,
  query: z.strictObject(pageQuery),
  body: nothing,
  result: pageOf(wallPhotoItem),
});
/** One JPEG or PNG in the field `file`. It is kept upright, at most 4,096 px on its longer side and without what the camera wrote into it. */
export const addWallPhoto = endpoint({
  method: "POST",
  path: "/api/shops/:shop/jobs/:jobId/wall-photos",
  summary: "Bring in a photo of the wall",
  params: oneJob,
  query: nothing,
  body: nothing,
  result: wallPhotoItem,
  form: "multipart",
  status: 201,
});
/** Also of a photo that was taken off the list: what shows it goes on showing it. */
export const getWallPhotoFile = endpoint({
  method: "GET",
  path: "/api/shops/:shop/wall-photos/:photoId/file",
  summary: "The photo, as a JPEG",
  params: onePhoto,
  query: nothing,
  body: nothing,
  result: noContent,
  form: "file",
});
export const removeWallPhoto = endpoint({
  method: "DELETE",
  path: "/api/shops/:shop/wall-photos/:photoId",
  summary: "Take a photo off the job's list; mockups, drafts and revisions that show it keep it",
  params: onePhoto,
  query: nothing,
  body: nothing,
  result: noContent,
  status: 204,
});
