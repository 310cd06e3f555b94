import { ownLimits, readLimits } from "#shared/dry-fit/check-limits.ts";
import { limitKeys } from "#shared/dry-fit/limit-descriptions.ts";
import type { Limits } from "#shared/dry-fit/limits.ts";
import { notAllowed, notFound, stale } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Shop } from "../models/shop.ts";
import { ShopLimits } from "../models/shop-limits.ts";
import { isStaff } from "../policies/actor.ts";
import { limitsPolicy } from "../policies/limits.ts";
import { presentLimits } from "../presenters/limits.ts";
import { findLimits } from "../queries/find-limits.ts";
import { logEvent } from "./log-event.ts";

/**
 * Sets the shop's limits if they were changed from the newest version; otherwise answers `stale` with the newer set. They
 * count for what is issued from now on.
 */
export async function changeLimits(
  context: Context,
  { shopId, version, limits }: { shopId: string; version: number; limits: Limits },
): Promise<ShopLimits | null> {
  const { actor, transaction, now } = context;
  if (!limitsPolicy.see(actor, { shopId })) throw notFound("limits");
  if (!isStaff(actor) || !limitsPolicy.change(actor, { shopId }))
    throw notAllowed("Only an owner sets the shop's limits.");
  // Before the first own limit there is no row of them to lock.
  await Shop.findByPk(shopId, { lock: transaction.LOCK.UPDATE, transaction, rejectOnEmpty: true });
  const kept = await findLimits(context, shopId);
  if (version !== (kept?.version ?? 0)) {
    throw stale(
      "Someone saved other limits while you were changing them. Keep theirs or yours.",
      presentLimits(actor, shopId, kept),
    );
  }
  const before = readLimits(kept?.own ?? {});
  const changes = limitKeys
    .filter((key) => before[key] !== limits[key])
    .map((key) => ({ limit: key, from: before[key], to: limits[key] }));
  if (changes.length === 0) return kept;
  const saved = { version: version + 1, own: ownLimits(limits), savedBy: actor.personId, savedAt: now };
  if (kept) await kept.update(saved, { transaction });
  else await ShopLimits.create({ shopId, ...saved }, { transaction });
  await logEvent(context, { shopId, kind: "limits changed", data: { changes } });
  return findLimits(context, shopId);
}
