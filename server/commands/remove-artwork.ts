import { notAllowed, notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import { artworkPolicy } from "../policies/artwork.ts";
import { findArtwork } from "../queries/find-artwork.ts";
import { findJob } from "../queries/find-job.ts";
import { logEvent } from "./log-event.ts";

/** Takes an artwork off the job's list. The file and its row stay: mockups and issued revisions refer to them. */
export async function removeArtwork(context: Context, artworkId: string): Promise<void> {
  const artwork = await findArtwork(context, artworkId);
  const { job, facts } = await findJob(context, artwork.jobId, { lock: true });
  if (!artworkPolicy.change(context.actor, facts)) throw notAllowed("Artwork is taken off by owners and makers.");
  const [removed] = await Artwork.update(
    { removedAt: context.now },
    { where: { id: artwork.id, shopId: job.shopId, removedAt: null }, transaction: context.transaction },
  );
  // Somebody else took it off while we waited for the job.
  if (removed === 0) throw notFound("artwork");
  await logEvent(context, { shopId: job.shopId, jobId: job.id, kind: "artwork removed", data: { name: artwork.name } });
}
