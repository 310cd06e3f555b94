import { ownSaws, readSaws, sawFields } from "#shared/cut-plan/saw-fields.ts";
import type { ShopSaws as Saws } from "#shared/cut-plan/shop-saws.ts";
import { notAllowed, notFound, stale } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Shop } from "../models/shop.ts";
import { ShopSaws } from "../models/shop-saws.ts";
import { sawsPolicy } from "../policies/saws.ts";
import { presentSaws } from "../presenters/saws.ts";
import { findSaws } from "../queries/find-saws.ts";
import { logEvent } from "./log-event.ts";

/** States how the shop cuts if that was changed from the newest version; otherwise answers `stale` with the newer set. */
export async function changeSaws(
  context: Context,
  { shopId, version, saws }: { shopId: string; version: number; saws: Saws },
): Promise<ShopSaws | null> {
  const { actor, transaction, now } = context;
  if (actor.kind !== "staff" || !sawsPolicy.see(actor, { shopId })) throw notFound("saws");
  if (!sawsPolicy.change(actor, { shopId })) throw notAllowed("Owners and makers say how the shop cuts.");
  // Before the first own figure there is no row of them to lock.
  await Shop.findByPk(shopId, { lock: transaction.LOCK.UPDATE, transaction, rejectOnEmpty: true });
  const kept = await findSaws(context, shopId);
  if (version !== (kept?.version ?? 0)) {
    throw stale(
      "Someone saved other figures while you were changing them. Keep theirs or yours.",
      presentSaws(actor, shopId, kept),
    );
  }
  const before = readSaws(kept?.own ?? {});
  const changes = sawFields
    .filter(({ key }) => before[key] !== saws[key])
    .map(({ key }) => ({ field: key, from: before[key], to: saws[key] }));
  if (changes.length === 0) return kept;
  const saved = { version: version + 1, own: ownSaws(saws), savedBy: actor.personId, savedAt: now };
  if (kept) await kept.update(saved, { transaction });
  else await ShopSaws.create({ shopId, ...saved }, { transaction });
  await logEvent(context, { shopId, kind: "saws changed", data: { changes } });
  return findSaws(context, shopId);
}
