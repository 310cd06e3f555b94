import * as contract from "#shared/contracts/stock.ts";
import { notFound } from "../http/app-error.ts";
import { type Routes, read } from "../http/route.ts";
import { stockPolicy } from "../policies/stock.ts";
import { presentStockItem } from "../presenters/stock-item.ts";
import { listStock } from "../queries/list-stock.ts";
import { pageOf } from "../queries/page.ts";

export function registerStockRoutes(routes: Routes): void {
  read(routes, contract.listStock, async (context, { query }) => {
    if (!stockPolicy.see(context.actor)) throw notFound("stock");
    return pageOf(await listStock(context, query), query.limit, presentStockItem, ({ id }) => [id]);
  });
}
