import { Op } from "sequelize";
import type { Context } from "../http/context.ts";
import { enqueue } from "../jobs/queue.ts";
import { Artwork } from "../models/artwork.ts";

/**
 * Sets the queue to turn a kept file into pieces, or to trace its picture again. One file is worked on at a time and a picture may take a
 * minute, so a shop's next file stands behind as many files of other shops as it has waiting itself: who brings sixty waits longest for the sixtieth.
 */
export async function queueImport(
  { transaction }: Pick<Context, "transaction">,
  { id, shopId }: Pick<Artwork, "id" | "shopId">,
): Promise<void> {
  const priority = await Artwork.count({
    where: {
      shopId,
      id: { [Op.ne]: id },
      [Op.or]: [{ state: "importing" }, { traceAsked: { [Op.not]: null } }],
    },
    transaction,
  });
  await enqueue(transaction, "import-artwork", { artworkId: id }, { priority });
}
