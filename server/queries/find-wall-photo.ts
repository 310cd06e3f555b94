import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { WallPhoto } from "../models/wall-photo.ts";
import { wallPhotoPolicy } from "../policies/wall-photo.ts";
import { findJob } from "./find-job.ts";

/** The photo of this shop that the actor may see, with its file and who brought it in, also when it was taken off its job; else "not found". */
export async function findWallPhoto(context: ReadContext, photoId: string): Promise<WallPhoto> {
  const { shop, transaction } = context;
  const photo = shop
    ? await WallPhoto.findOne({ where: { id: photoId, shopId: shop.id }, include: ["file", "adder"], transaction })
    : null;
  if (!photo) throw notFound("photo");
  const { facts } = await findJob(context, photo.jobId);
  if (!wallPhotoPolicy.see(context.actor, facts)) throw notFound("photo");
  return photo;
}
