import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import { artworkPolicy } from "../policies/artwork.ts";
import { findJob } from "./find-job.ts";

/** The pieces can be megabytes: only where they are asked for. */
export const artworkColumns = { exclude: ["pieces"] };

/** The artwork of this shop that the actor may see, with its file and who added it, else "not found". */
export async function findArtwork(
  context: ReadContext,
  artworkId: string,
  { withPieces = false }: { withPieces?: boolean } = {},
): Promise<Artwork> {
  const { shop, transaction } = context;
  const artwork = shop
    ? await Artwork.findOne({
        where: { id: artworkId, shopId: shop.id, removedAt: null },
        ...(withPieces ? {} : { attributes: artworkColumns }),
        include: ["file", "adder"],
        transaction,
      })
    : null;
  if (!artwork) throw notFound("artwork");
  const { facts } = await findJob(context, artwork.jobId);
  if (!artworkPolicy.see(context.actor, facts)) throw notFound("artwork");
  return artwork;
}
