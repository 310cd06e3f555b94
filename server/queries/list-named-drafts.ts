import { literal, Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import { NamedDraft } from "../models/named-draft.ts";
import { draftColumns } from "./find-named-draft.ts";
import { readTimeCursor } from "./page.ts";

/** Up to `limit + 1` drafts of a job of this shop, newest first, without their documents. */
export async function listNamedDrafts(
  { shop, transaction }: ReadContext,
  jobId: string,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<NamedDraft[]> {
  const after = readTimeCursor(cursor);
  return NamedDraft.findAll({
    where: {
      [Op.and]: [
        { shopId: shop?.id ?? "", jobId, removedAt: null },
        ...(after ? [literal(`("NamedDraft"."kept_at", "NamedDraft"."id") < (:at, :id)`)] : []),
      ],
    },
    attributes: draftColumns,
    include: ["keeper"],
    order: [
      ["keptAt", "desc"],
      ["id", "desc"],
    ],
    limit: limit + 1,
    replacements: { ...after },
    transaction,
  });
}

/** How many drafts a job has and how many bytes of text they hold together. */
export async function measureDrafts(
  { transaction }: Pick<ReadContext, "transaction">,
  { shopId, jobId }: { shopId: string; jobId: string },
): Promise<{ count: number; bytes: number }> {
  const [row] = await NamedDraft.findAll({
    where: { shopId, jobId, removedAt: null },
    attributes: [
      [literal("count(*)::int"), "count"],
      [literal("coalesce(sum(octet_length(document)), 0)::float8"), "bytes"],
    ],
    transaction,
  });
  return { count: Number(row?.get("count") ?? 0), bytes: Number(row?.get("bytes") ?? 0) };
}
