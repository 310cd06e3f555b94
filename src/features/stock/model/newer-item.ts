import { type StockItem, stockItemSchema } from "#shared/contracts/stock.ts";
import { ApiProblem } from "@/lib/api-client.ts";

/** The item as somebody else saved it meanwhile, when that is why it was refused. */
export function newerItem(error: unknown): StockItem | null {
  if (!(error instanceof ApiProblem) || error.code !== "stale") return null;
  const read = stockItemSchema.safeParse(error.problem?.extra?.newer);
  return read.success ? read.data : null;
}
