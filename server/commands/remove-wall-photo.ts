import { notAllowed, notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { WallPhoto } from "../models/wall-photo.ts";
import { wallPhotoPolicy } from "../policies/wall-photo.ts";
import { findJob } from "../queries/find-job.ts";
import { findWallPhoto } from "../queries/find-wall-photo.ts";
import { logEvent } from "./log-event.ts";

/** Takes a photo off the job's list. File and row stay: mockups, drafts and issued revisions show it. */
export async function removeWallPhoto(context: Context, photoId: string): Promise<void> {
  const photo = await findWallPhoto(context, photoId);
  const { job, facts } = await findJob(context, photo.jobId, { lock: true });
  if (!wallPhotoPolicy.change(context.actor, facts)) throw notAllowed("Photos are taken off by owners and makers.");
  const [removed] = await WallPhoto.update(
    { removedAt: context.now },
    { where: { id: photo.id, shopId: job.shopId, removedAt: null }, transaction: context.transaction },
  );
  if (removed === 0) throw notFound("photo");
  await logEvent(context, {
    shopId: job.shopId,
    jobId: job.id,
    kind: "wall photo removed",
    data: { name: photo.name },
  });
}
