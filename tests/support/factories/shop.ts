import { newId } from "#server/db/new-id.ts";
import { Shop } from "#server/models/shop.ts";
import { unique } from "./unique.ts";

export function buildShop(
  overrides: Partial<Pick<Shop, "slug" | "name" | "unit" | "jobPrefix" | "paper" | "demo">> = {},
): Promise<Shop> {
  const number = unique();
  return Shop.create({
    id: newId(),
    slug: `shop-${number}`,
    name: `Shop ${number}`,
    unit: "mm",
    jobPrefix: "SH",
    paper: "A4",
    createdAt: new Date(),
    ...overrides,
  });
}
