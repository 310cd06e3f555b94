import { literal, Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import { artworkColumns } from "./find-artwork.ts";
import { readCursor } from "./page.ts";

/** Up to `limit + 1` artworks of a job, newest first. */
export async function listArtworks(
  { shop, transaction }: ReadContext,
  jobId: string,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<Artwork[]> {
  const after = readCursor(cursor, 2);
  return Artwork.findAll({
    where: {
      [Op.and]: [
        { shopId: shop?.id ?? "", jobId, removedAt: null },
        ...(after ? [literal(`("Artwork"."added_at", "Artwork"."id") < (:addedAt, :id)`)] : []),
      ],
    },
    attributes: artworkColumns,
    include: ["file", "adder"],
    order: [
      ["addedAt", "desc"],
      ["id", "desc"],
    ],
    limit: limit + 1,
    replacements: after ? { addedAt: after[0], id: after[1] } : {},
    transaction,
  });
}
