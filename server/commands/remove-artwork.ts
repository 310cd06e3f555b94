import { notAllowed } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { artworkPolicy } from "../policies/artwork.ts";
import { findArtwork } from "../queries/find-artwork.ts";
import { findJob } from "../queries/find-job.ts";
import { logEvent } from "./log-event.ts";

/** Takes an artwork off the job's list. The file and its row stay: mockups and issued revisions refer to them. */
export async function removeArtwork(context: Context, artworkId: string): Promise<void> {
  const artwork = await findArtwork(context, artworkId);
  const { job, facts } = await findJob(context, artwork.jobId, { lock: true });
  if (!artworkPolicy.change(context.actor, facts)) throw notAllowed("Artwork is taken off by owners and makers.");
  await artwork.update({ removedAt: context.now }, { transaction: context.transaction });
  await logEvent(context, { shopId: job.shopId, jobId: job.id, kind: "artwork removed", data: { name: artwork.name } });
}
