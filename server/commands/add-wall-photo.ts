import { newId } from "../db/new-id.ts";
import { notAllowed, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { WallPhoto } from "../models/wall-photo.ts";
import type { PreparedPhoto } from "../photos/prepare-photo.ts";
import { isStaff } from "../policies/actor.ts";
import { wallPhotoPolicy } from "../policies/wall-photo.ts";
import { findJob } from "../queries/find-job.ts";
import { logEvent } from "./log-event.ts";
import { storeReceivedFile } from "./store-file.ts";

/** A job's wall is one place: more photos of it than this are a mistake or a flood. */
const mostPhotos = 30;

/** Keeps a photo of the job's wall that was made ready to show. */
export async function addWallPhoto(
  context: Context,
  { jobId, photo }: { jobId: string; photo: PreparedPhoto },
): Promise<WallPhoto> {
  const { transaction, actor, now } = context;
  const { job, facts } = await findJob(context, jobId, { lock: true });
  if (!isStaff(actor) || !wallPhotoPolicy.change(actor, facts))
    throw notAllowed("Photos are brought in by owners and makers.");
  const known = await WallPhoto.count({ where: { shopId: job.shopId, jobId, removedAt: null }, transaction });
  if (known >= mostPhotos)
    throw wrongState(`This job has ${mostPhotos} photos. Take one off that is of no more use, then bring this one in.`);
  const stored = await storeReceivedFile(context, { shopId: job.shopId, file: photo, mediaType: "image/jpeg" });
  const { widthPx, heightPx } = photo;
  const row = { id: newId(), shopId: job.shopId, jobId, fileId: stored.id, name: photo.originalName };
  const added = await WallPhoto.create(
    { ...row, widthPx, heightPx, addedBy: actor.personId, addedAt: now },
    { transaction },
  );
  await logEvent(context, { shopId: job.shopId, jobId, kind: "wall photo added", data: { name: added.name } });
  return added;
}
