import { z } from "zod";
import { hardwareSchema } from "../mockup/hardware-schemas.ts";
import { acrylicSchema, adhesiveSchema, woodSchema } from "../mockup/stock-schemas.ts";
import { inShop, nothing, pageOf, pageQuery } from "./common.ts";
import { endpoint } from "./endpoint.ts";

const base = { id: z.uuid(), name: z.string() };
export const stockItemSchema = z.discriminatedUnion("kind", [
  z.strictObject({ ...base, kind: z.literal("acrylic"), acrylic: acrylicSchema, thicknessesMm: z.array(z.number()) }),
  z.strictObject({ ...base, kind: z.literal("wood"), wood: woodSchema, thicknessesMm: z.array(z.number()) }),
  z.strictObject({
    ...base,
    kind: z.literal("hardware"),
    hardware: hardwareSchema,
    /** Null until somebody has counted. */ quantity: z.number().int().nullable(),
  }),
  z.strictObject({ ...base, kind: z.literal("adhesive"), adhesive: adhesiveSchema }),
]);
export type StockItem = z.infer<typeof stockItemSchema>;

export const listStock = endpoint({
  method: "GET",
  path: "/api/shops/:shop/stock",
  summary: "What the shop has on hand",
  params: inShop,
  query: z.strictObject({ ...pageQuery, kind: z.enum(["acrylic", "wood", "hardware", "adhesive"]).optional() }),
  body: nothing,
  result: pageOf(stockItemSchema),
});
