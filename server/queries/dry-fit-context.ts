import type { DryFitContext } from "#shared/dry-fit/rule.ts";
import { acrylicSchema, capStudSchema } from "#shared/mockup/document.ts";
import type { ReadContext } from "../http/context.ts";
import type { Shop } from "../models/shop.ts";
import { StockItem } from "../models/stock-item.ts";

/** What the dry fit knows of the shop: its unit and what it could use instead. */
export async function dryFitContext(
  { transaction }: ReadContext,
  { shop, place }: { shop: Shop; place: "inside" | "outside" },
): Promise<DryFitContext> {
  const items = await StockItem.findAll({
    where: { shopId: shop.id, kind: ["acrylic", "hardware"], retiredAt: null },
    order: ["name", "id"],
    transaction,
  });
  return {
    unit: shop.unit,
    place,
    acrylics: items.flatMap(({ kind, properties }) =>
      kind === "acrylic" ? [acrylicSchema.parse(properties.acrylic)] : [],
    ),
    barrels: items.flatMap(({ kind, properties }) =>
      kind === "hardware" ? [capStudSchema.parse(properties.hardware)] : [],
    ),
  };
}
