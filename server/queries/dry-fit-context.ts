import { z } from "zod";
import type { Brief } from "#shared/contracts/jobs.ts";
import type { DryFitContext } from "#shared/dry-fit/rule.ts";
import { standardScrews } from "#shared/materials/standard-stock.ts";
import type { Stock } from "#shared/materials/stock.ts";
import { hardwareSchema } from "#shared/mockup/hardware-schemas.ts";
import { acrylicSchema, adhesiveSchema, woodSchema } from "#shared/mockup/stock-schemas.ts";
import type { ReadContext } from "../http/context.ts";
import type { Shop } from "../models/shop.ts";
import { StockItem } from "../models/stock-item.ts";

/** What the dry fit knows besides the sign: the shop's unit and stock, and what the brief says. */
export async function dryFitContext(
  context: ReadContext,
  { shop, brief }: { shop: Shop; brief: Brief },
): Promise<DryFitContext> {
  return {
    unit: shop.unit,
    place: brief.place ?? "inside",
    walkway: false,
    overhead: false,
    electrical: false,
    words: brief.words,
    stock: await stockOf(context, shop.id),
  };
}

const thicknesses = z.array(z.number());

async function stockOf({ transaction }: ReadContext, shopId: string): Promise<Stock> {
  const items = await StockItem.findAll({ where: { shopId, retiredAt: null }, order: ["name", "id"], transaction });
  const of = (kind: StockItem["kind"]) => items.filter((item) => item.kind === kind);
  return {
    acrylics: of("acrylic").map(({ properties }) => ({
      acrylic: acrylicSchema.parse(properties.acrylic),
      thicknessesMm: thicknesses.parse(properties.thicknessesMm),
      sheets: [],
    })),
    woods: of("wood").map(({ properties }) => ({
      wood: woodSchema.parse(properties.wood),
      thicknessesMm: thicknesses.parse(properties.thicknessesMm),
    })),
    hardware: of("hardware").map(({ properties, quantity }) => ({
      hardware: hardwareSchema.parse(properties.hardware),
      quantity,
    })),
    screws: standardScrews,
    adhesives: of("adhesive").map(({ properties }) => adhesiveSchema.parse(properties.adhesive)),
  };
}
