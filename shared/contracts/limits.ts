import { z } from "zod";
import { crossedLimits } from "../dry-fit/check-limits.ts";
import { limitsSchema } from "../dry-fit/limits.ts";
import { inShop, instant, nothing } from "./common.ts";
import { endpoint } from "./endpoint.ts";

type Fields = typeof limitsSchema.shape;

/** Every limit is asked for: one left out must not fall back to its default unseen. */
const wholeSet = z.strictObject(
  Object.fromEntries(Object.entries(limitsSchema.shape).map(([key, field]) => [key, field.unwrap()])) as {
    [K in keyof Fields]: ReturnType<Fields[K]["unwrap"]>;
  },
);

export const limitSetSchema = z.strictObject({
  /** 0 before the shop set any of its own. */
  version: z.number().int().min(0),
  limits: wholeSet,
  savedAt: instant.nullable(),
  savedBy: z.string().nullable(),
  can: z.strictObject({ change: z.boolean() }),
});
export type LimitSet = z.infer<typeof limitSetSchema>;

export const getLimits = endpoint({
  method: "GET",
  path: "/api/shops/:shop/limits",
  summary: "The limits that the dry fit of this shop keeps to",
  params: inShop,
  query: nothing,
  body: nothing,
  result: limitSetSchema,
});

/** `version` is the one the change began from. A newer one answers `stale` with the newer set in `extra.newer`. */
export const changeLimits = endpoint({
  method: "PUT",
  path: "/api/shops/:shop/limits",
  summary: "Set the shop's limits",
  params: inShop,
  query: nothing,
  body: z.strictObject({
    version: z.number().int().min(0),
    limits: wholeSet.superRefine((limits, context) => {
      for (const { key, detail } of crossedLimits(limits, "mm"))
        context.addIssue({ code: "custom", path: [key], message: detail });
    }),
  }),
  result: limitSetSchema,
});
