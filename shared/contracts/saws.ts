import { z } from "zod";
import { type ShopSaws, shopSawsSchema } from "../cut-plan/shop-saws.ts";
import { inShop, instant, nothing } from "./common.ts";
import { endpoint } from "./endpoint.ts";

type Fields = typeof shopSawsSchema.shape;

/** Every figure is asked for: one left out must not fall back to its default unseen. */
const wholeSet = z.strictObject(
  Object.fromEntries(Object.entries(shopSawsSchema.shape).map(([key, field]) => [key, field.unwrap()])) as {
    [K in keyof Fields]: ReturnType<Fields[K]["unwrap"]>;
  },
) satisfies z.ZodType<ShopSaws>;

export const sawSetSchema = z.strictObject({
  /** 0 before the shop stated any of its own. */
  version: z.number().int().min(0),
  saws: wholeSet,
  savedAt: instant.nullable(),
  savedBy: z.string().nullable(),
  can: z.strictObject({ change: z.boolean() }),
});
export type SawSet = z.infer<typeof sawSetSchema>;

export const getSaws = endpoint({
  method: "GET",
  path: "/api/shops/:shop/saws",
  summary: "How this shop cuts: its saws and the sheets and bars it buys",
  params: inShop,
  query: nothing,
  body: nothing,
  result: sawSetSchema,
});

/** `version` is the one the change began from. A newer one answers `stale` with the newer set in `extra.newer`. */
export const changeSaws = endpoint({
  method: "PUT",
  path: "/api/shops/:shop/saws",
  summary: "State how the shop cuts",
  params: inShop,
  query: nothing,
  body: z.strictObject({ version: z.number().int().min(0), saws: wholeSet }),
  result: sawSetSchema,
});
