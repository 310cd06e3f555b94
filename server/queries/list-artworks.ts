import { literal, Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import { artworkColumns } from "./find-artwork.ts";
import { readTimeCursor } from "./page.ts";

/** Up to `limit + 1` artworks of a job, newest first. */
export async function listArtworks(
  { shop, transaction }: ReadContext,
  jobId: string,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<Artwork[]> {
  const after = readTimeCursor(cursor);
  return Artwork.findAll({
    where: {
      [Op.and]: [
        { shopId: shop?.id ?? "", jobId, removedAt: null },
        ...(after ? [literal(`("Artwork"."added_at", "Artwork"."id") < (:at, :id)`)] : []),
      ],
    },
    attributes: artworkColumns,
    include: ["file", "adder"],
    order: [
      ["addedAt", "desc"],
      ["id", "desc"],
    ],
    limit: limit + 1,
    replacements: { ...after },
    transaction,
  });
}
