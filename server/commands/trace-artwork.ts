import type { TraceChoices } from "#shared/tracing/trace-choices.ts";
import { notAllowed, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import type { Artwork } from "../models/artwork.ts";
import { isPicture } from "../models/artwork.ts";
import { artworkPolicy } from "../policies/artwork.ts";
import { findArtwork } from "../queries/find-artwork.ts";
import { findJob } from "../queries/find-job.ts";
import { queueImport } from "./queue-import.ts";

/**
 * Sets the queue to trace a picture again with other choices. Until that is done the artwork keeps its pieces, and it keeps them when
 * it fails. Asking again while it is under way asks for the newer choices only. Pieces in mockups are copies and stay.
 */
export async function traceArtwork(context: Context, artworkId: string, choices: TraceChoices): Promise<Artwork> {
  const artwork = await lockedPicture(context, artworkId);
  if (artwork.state === "importing") throw wrongState("This picture is still being traced for the first time.");
  await artwork.update({ traceAsked: choices, traceFailure: null }, { transaction: context.transaction });
  await queueImport(context, artwork);
  return artwork;
}

/** Gives up tracing again: the pieces stay what they were. Changes nothing when nothing is under way. */
export async function cancelTrace(context: Context, artworkId: string): Promise<Artwork> {
  const artwork = await lockedPicture(context, artworkId);
  return artwork.update({ traceAsked: null, traceFailure: null }, { transaction: context.transaction });
}

async function lockedPicture(context: Context, artworkId: string): Promise<Artwork> {
  const { jobId } = await findArtwork(context, artworkId);
  const { facts } = await findJob(context, jobId, { lock: true });
  if (!artworkPolicy.change(context.actor, facts)) throw notAllowed("Pictures are traced by owners and makers.");
  // Read again behind the lock: a trace that ended meanwhile has changed the row.
  const artwork = await findArtwork(context, artworkId);
  if (!isPicture(artwork)) throw wrongState("Only pictures are traced. A drawing brings its own outlines.");
  return artwork;
}
