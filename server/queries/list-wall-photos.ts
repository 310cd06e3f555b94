import { literal, Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import { WallPhoto } from "../models/wall-photo.ts";
import { readTimeCursor } from "./page.ts";

/** Up to `limit + 1` photos on a job's list, newest first. */
export async function listWallPhotos(
  { shop, transaction }: ReadContext,
  jobId: string,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<WallPhoto[]> {
  const after = readTimeCursor(cursor);
  return WallPhoto.findAll({
    where: {
      [Op.and]: [
        { shopId: shop?.id ?? "", jobId, removedAt: null },
        ...(after ? [literal(`("WallPhoto"."added_at", "WallPhoto"."id") < (:at, :id)`)] : []),
      ],
    },
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
