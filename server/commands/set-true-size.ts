import { invalid, notAllowed, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import type { Artwork } from "../models/artwork.ts";
import { artworkPolicy } from "../policies/artwork.ts";
import { findArtwork } from "../queries/find-artwork.ts";
import { findJob } from "../queries/find-job.ts";

/** Longest side artwork may get; the mockup document takes nothing longer. Below the shortest nothing can be cut. */
const longestMm = 10_000;
const shortestMm = 1;

/** Sets the artwork's scale so that the named side has the given length. Pieces already in the mockup keep their size. */
export async function setTrueSize(
  context: Context,
  artworkId: string,
  { side, lengthMm }: { side: "width" | "height"; lengthMm: number },
): Promise<Artwork> {
  const artwork = await findArtwork(context, artworkId);
  const { facts } = await findJob(context, artwork.jobId, { lock: true });
  if (!artworkPolicy.change(context.actor, facts)) throw notAllowed("The true size is set by owners and makers.");
  if (!artwork.summary) throw wrongState("The size can be set once the artwork has become pieces.");
  const { widthMm, heightMm } = artwork.summary;
  const scale = lengthMm / (side === "width" ? widthMm : heightMm);
  const longer = Math.max(widthMm, heightMm) * scale;
  if (longer > longestMm)
    throw invalid([{ pointer: "/lengthMm", detail: "The other side would be longer than 10 m." }]);
  if (longer < shortestMm) throw invalid([{ pointer: "/lengthMm", detail: "The artwork would be smaller than 1 mm." }]);
  return artwork.update({ scale }, { transaction: context.transaction });
}
