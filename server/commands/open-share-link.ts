import { tokenHash } from "../auth/tokens.ts";
import { AppError, notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { ShareLink } from "../models/share-link.ts";
import { Shop } from "../models/shop.ts";
import { type ApprovedPiece, findShowable } from "../queries/portfolio.ts";
import { logEvent } from "./log-event.ts";

/** What a live link shows now: pieces whose consent was taken back since are left out. Counts the opening. */
export async function openShareLink(context: Context, token: string): Promise<{ shop: Shop; pieces: ApprovedPiece[] }> {
  const { transaction, now } = context;
  const link = await ShareLink.findOne({ where: { tokenHash: tokenHash(token) }, include: ["pieces"], transaction });
  if (!link) throw notFound("link");
  if (link.revokedAt || link.expiresAt <= now)
    throw new AppError("link_expired", { detail: "This link has been closed. Ask the shop for a new one." });
  const shop = await Shop.findByPk(link.shopId, { transaction, rejectOnEmpty: true });
  const jobIds = (link.pieces ?? []).map(({ jobId }) => jobId);
  const pieces = await findShowable({ ...context, shop: { id: shop.id, slug: shop.slug } }, jobIds);
  if (link.openings === 0)
    // Whoever opens it is a guest here, also when signed in at another shop.
    await logEvent(
      { ...context, actor: { kind: "nobody" } },
      { shopId: shop.id, kind: "share link opened", data: { label: link.label } },
    );
  await link.increment("openings", { transaction });
  await link.update({ lastOpenedAt: now }, { transaction });
  return { shop, pieces: pieces.sort((a, b) => jobIds.indexOf(a.job.id) - jobIds.indexOf(b.job.id)) };
}
