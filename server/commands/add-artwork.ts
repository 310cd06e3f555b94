import { newId } from "../db/new-id.ts";
import { notAllowed } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import type { ReceivedFile } from "../http/uploads.ts";
import { Artwork } from "../models/artwork.ts";
import { isStaff } from "../policies/actor.ts";
import { artworkPolicy } from "../policies/artwork.ts";
import { findJob } from "../queries/find-job.ts";
import { logEvent } from "./log-event.ts";
import { queueImport } from "./queue-import.ts";
import { storeReceivedFile } from "./store-file.ts";

/** Keeps a drawing as it came and sets the queue to turn it into pieces. The caller has looked at its content. */
export async function addArtwork(
  context: Context,
  { jobId, file, mediaType }: { jobId: string; file: ReceivedFile; mediaType: string },
): Promise<Artwork> {
  const { transaction, actor, now } = context;
  const { job, facts } = await findJob(context, jobId, { lock: true });
  if (!isStaff(actor) || !artworkPolicy.change(actor, facts))
    throw notAllowed("Artwork is brought in by owners and makers.");
  const stored = await storeReceivedFile(context, { shopId: job.shopId, file, mediaType });
  const artwork = await Artwork.create(
    {
      id: newId(),
      shopId: job.shopId,
      jobId,
      fileId: stored.id,
      name: file.originalName,
      state: "importing",
      addedBy: actor.personId,
      addedAt: now,
    },
    { transaction },
  );
  await queueImport(context, artwork);
  await logEvent(context, { shopId: job.shopId, jobId, kind: "artwork added", data: { name: artwork.name } });
  return artwork;
}
