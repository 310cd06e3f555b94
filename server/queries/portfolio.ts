import { literal, Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import type { Client } from "../models/client.ts";
import { Job } from "../models/job.ts";
import { Revision } from "../models/revision.ts";
import { ShareLink } from "../models/share-link.ts";
import { readTimeCursor } from "./page.ts";

type PageQuery = { readonly cursor?: string | undefined; readonly limit: number };

/** A job with its approved revision, snapshot included. */
export type ApprovedPiece = { readonly job: Job; readonly client: Client; readonly revision: Revision };

/** Up to `limit + 1` jobs of the shop that have an approved revision, newest first. */
export async function listApprovedPieces(
  { shop, transaction }: ReadContext,
  { cursor, limit }: PageQuery,
): Promise<ApprovedPiece[]> {
  const after = readTimeCursor(cursor);
  const jobs = await Job.findAll({
    where: {
      [Op.and]: [
        { shopId: shop?.id ?? "" },
        literal(`exists (select 1 from revisions r where r.job_id = "Job"."id" and r.state = 'approved')`),
        ...(after ? [literal(`("Job"."created_at", "Job"."id") < (:at, :id)`)] : []),
      ],
    },
    include: ["client"],
    order: [
      ["createdAt", "desc"],
      ["id", "desc"],
    ],
    limit: limit + 1,
    replacements: { ...after },
    transaction,
  });
  return piecesOf(jobs, await approvedRevisions({ transaction }, jobs));
}

/** Those of the named jobs of the shop that are approved and whose client lets them be shown. */
export async function findShowable(
  { shop, transaction }: ReadContext,
  jobIds: readonly string[],
): Promise<ApprovedPiece[]> {
  const jobs = await Job.findAll({
    where: { id: [...jobIds], shopId: shop?.id ?? "", consentAt: { [Op.ne]: null } },
    include: ["client"],
    transaction,
  });
  return piecesOf(jobs, await approvedRevisions({ transaction }, jobs));
}

function approvedRevisions(
  { transaction }: Pick<ReadContext, "transaction">,
  jobs: readonly Job[],
): Promise<Revision[]> {
  return Revision.findAll({ where: { jobId: jobs.map(({ id }) => id), state: "approved" }, transaction });
}

function piecesOf(jobs: readonly Job[], revisions: readonly Revision[]): ApprovedPiece[] {
  return jobs.flatMap((job) => {
    const revision = revisions.find(({ jobId }) => jobId === job.id);
    return revision && job.client ? [{ job, client: job.client, revision }] : [];
  });
}

/** Up to `limit + 1` portfolio links of the shop with their pieces, newest first. */
export async function listShareLinks(
  { shop, transaction }: ReadContext,
  { cursor, limit }: PageQuery,
): Promise<ShareLink[]> {
  const after = readTimeCursor(cursor);
  return ShareLink.findAll({
    where: {
      [Op.and]: [
        { shopId: shop?.id ?? "" },
        ...(after ? [literal(`("ShareLink"."created_at", "ShareLink"."id") < (:at, :id)`)] : []),
      ],
    },
    include: withPieces,
    order: [
      ["createdAt", "desc"],
      ["id", "desc"],
    ],
    limit: limit + 1,
    replacements: { ...after },
    transaction,
  });
}

const withPieces = ["maker", { association: "pieces", include: ["job"] }];

export function findShareLink({ shop, transaction }: ReadContext, linkId: string): Promise<ShareLink | null> {
  return ShareLink.findOne({ where: { id: linkId, shopId: shop?.id ?? "" }, include: withPieces, transaction });
}
