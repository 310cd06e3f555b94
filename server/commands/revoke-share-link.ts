import { notAllowed, notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { portfolioPolicy } from "../policies/portfolio.ts";
import { findShareLink } from "../queries/portfolio.ts";
import { logEvent } from "./log-event.ts";

/** Closes a link at once. Closing it again changes nothing. */
export async function revokeShareLink(context: Context, linkId: string): Promise<void> {
  if (!portfolioPolicy.see(context.actor)) throw notFound("link");
  if (!portfolioPolicy.share(context.actor)) throw notAllowed("Portfolio links are closed by owners and reps.");
  const link = await findShareLink(context, linkId);
  if (!link) throw notFound("link");
  if (link.revokedAt) return;
  await link.update({ revokedAt: context.now }, { transaction: context.transaction });
  await logEvent(context, { shopId: link.shopId, kind: "share link revoked", data: { label: link.label } });
}
