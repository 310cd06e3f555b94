import { newToken, tokenHash } from "../auth/tokens.ts";
import { newId } from "../db/new-id.ts";
import { invalid, notAllowed } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { ShareLink } from "../models/share-link.ts";
import { ShareLinkPiece } from "../models/share-link-piece.ts";
import { isStaff } from "../policies/actor.ts";
import { portfolioPolicy } from "../policies/portfolio.ts";
import { findShowable } from "../queries/portfolio.ts";
import { logEvent } from "./log-event.ts";

/** Makes a portfolio link to approved pieces whose clients consent. The token is given back once; only its hash is kept. */
export async function makeShareLink(
  context: Context,
  { label, jobIds, days }: { label: string; jobIds: readonly string[]; days: number },
): Promise<{ linkId: string; token: string }> {
  const { actor, shop, transaction, now } = context;
  if (!isStaff(actor) || !portfolioPolicy.share(actor) || !shop)
    throw notAllowed("Portfolio links are made by owners and reps.");
  const wanted = [...new Set(jobIds)];
  const showable = await findShowable(context, wanted);
  if (showable.length !== wanted.length) {
    throw invalid([{ pointer: "/jobIds", detail: "Only approved pieces whose client agreed can be shown." }]);
  }
  const token = newToken();
  const link = await ShareLink.create(
    {
      id: newId(),
      shopId: shop.id,
      tokenHash: tokenHash(token),
      label,
      createdBy: actor.personId,
      createdAt: now,
      expiresAt: new Date(now.getTime() + days * 86_400_000),
    },
    { transaction },
  );
  await ShareLinkPiece.bulkCreate(
    showable.map(({ job, revision }) => ({
      shareLinkId: link.id,
      jobId: job.id,
      shopId: shop.id,
      revisionId: revision.id,
    })),
    { transaction },
  );
  await logEvent(context, { shopId: shop.id, kind: "share link made", data: { label } });
  return { linkId: link.id, token };
}
