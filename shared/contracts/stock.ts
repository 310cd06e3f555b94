import { z } from "zod";
import { hardwareSchema } from "../mockup/hardware-schemas.ts";
import { acrylicSchema, adhesiveSchema, screwSchema, woodSchema } from "../mockup/stock-schemas.ts";
import { inShop, instant, nothing, pageOf, pageQuery } from "./common.ts";
import { endpoint } from "./endpoint.ts";
import { quantityOnHand, sheetsOnHandSchema, stockEntryIn, stockKind } from "./stock-entry.ts";

const base = {
  id: z.uuid(),
  name: z.string(),
  /** Grows with each change. */
  version: z.int().min(1),
  /** When it was taken out of stock; drawings keep naming it. */
  retiredAt: instant.nullable(),
};
const thicknessesMm = z.array(z.number());
export const stockItemSchema = z.discriminatedUnion("kind", [
  z.strictObject({
    ...base,
    kind: z.literal("acrylic"),
    acrylic: acrylicSchema,
    thicknessesMm,
    sheets: z.array(sheetsOnHandSchema),
  }),
  z.strictObject({ ...base, kind: z.literal("wood"), wood: woodSchema, thicknessesMm }),
  z.strictObject({ ...base, kind: z.literal("hardware"), hardware: hardwareSchema, quantity: quantityOnHand }),
  z.strictObject({ ...base, kind: z.literal("screw"), screw: screwSchema, quantity: quantityOnHand }),
  z.strictObject({ ...base, kind: z.literal("adhesive"), adhesive: adhesiveSchema }),
]);
export type StockItem = z.infer<typeof stockItemSchema>;

const stockState = z.enum(["in stock", "retired"]);
const oneItem = inShop.extend({ itemId: z.uuid() });
const entry = stockEntryIn("mm");
/** The one that the change began from. A newer one answers `stale` with the item as it is now in `extra.newer`. */
const version = z.int().min(1);

export const listStock = endpoint({
  method: "GET",
  path: "/api/shops/:shop/stock",
  summary: "What the shop has on hand, or no longer has",
  params: inShop,
  query: z.strictObject({
    ...pageQuery,
    kind: stockKind.optional(),
    q: z.string().max(200).optional(),
    state: stockState.default("in stock"),
  }),
  body: nothing,
  result: pageOf(stockItemSchema),
});

export const addStockItem = endpoint({
  method: "POST",
  path: "/api/shops/:shop/stock",
  summary: "Add to the stock list",
  params: inShop,
  query: nothing,
  body: z.strictObject({ entry }),
  result: stockItemSchema,
  status: 201,
});

export const changeStockItem = endpoint({
  method: "PUT",
  path: "/api/shops/:shop/stock/:itemId",
  summary: "Change an item of the stock list as a whole. Drawings keep what they were drawn with.",
  params: oneItem,
  query: nothing,
  body: z.strictObject({ version, entry }),
  result: stockItemSchema,
});

export const countStockItem = endpoint({
  method: "PUT",
  path: "/api/shops/:shop/stock/:itemId/quantity",
  summary: "Say how many of a standoff or screw are on hand",
  params: oneItem,
  query: nothing,
  body: z.strictObject({ version, quantity: quantityOnHand }),
  result: stockItemSchema,
});

export const setStockState = endpoint({
  method: "PUT",
  path: "/api/shops/:shop/stock/:itemId/state",
  summary: "Take an item out of stock or bring it back. It is never deleted, since drawings name it.",
  params: oneItem,
  query: nothing,
  body: z.strictObject({ state: stockState }),
  result: stockItemSchema,
});

export const addUsualStock = endpoint({
  method: "POST",
  path: "/api/shops/:shop/stock/usual",
  summary: "Add what is missing of the list that shops start with; what was taken out of stock stays out",
  params: inShop,
  query: nothing,
  body: nothing,
  result: z.strictObject({ added: z.int().min(0) }),
});
