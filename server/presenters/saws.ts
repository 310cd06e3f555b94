import type { SawSet } from "#shared/contracts/saws.ts";
import { readSaws } from "#shared/cut-plan/saw-fields.ts";
import type { ShopSaws } from "../models/shop-saws.ts";
import type { Actor } from "../policies/actor.ts";
import { sawsPolicy } from "../policies/saws.ts";

/** How the shop cuts; the defaults, version 0, while it stated nothing of its own. */
export function presentSaws(actor: Actor, shopId: string, kept: ShopSaws | null): SawSet {
  return {
    version: kept?.version ?? 0,
    saws: readSaws(kept?.own ?? {}),
    savedAt: kept?.savedAt.toISOString() ?? null,
    savedBy: kept?.saver?.name ?? null,
    can: { change: sawsPolicy.change(actor, { shopId }) },
  };
}
