import type { LimitSet } from "#shared/contracts/limits.ts";
import { readLimits } from "#shared/dry-fit/check-limits.ts";
import type { ShopLimits } from "../models/shop-limits.ts";
import type { Actor } from "../policies/actor.ts";
import { limitsPolicy } from "../policies/limits.ts";

/** The limits in force; the defaults, version 0, while the shop has none of its own. */
export function presentLimits(actor: Actor, shopId: string, kept: ShopLimits | null): LimitSet {
  return {
    version: kept?.version ?? 0,
    limits: readLimits(kept?.own ?? {}),
    savedAt: kept?.savedAt.toISOString() ?? null,
    savedBy: kept?.saver?.name ?? null,
    can: { change: limitsPolicy.change(actor, { shopId }) },
  };
}
