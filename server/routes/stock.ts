import * as contract from "#shared/contracts/stock.ts";
import { addStockItem, addUsualStock } from "../commands/add-stock-item.ts";
import { changeStockItem, countStockItem, setStockState } from "../commands/change-stock-item.ts";
import { notFound } from "../http/app-error.ts";
import { type Routes, read, write } from "../http/route.ts";
import { stockPolicy } from "../policies/stock.ts";
import { presentStockItem } from "../presenters/stock-item.ts";
import { listStock } from "../queries/list-stock.ts";
import { pageOf } from "../queries/page.ts";

export function registerStockRoutes(routes: Routes): void {
  read(routes, contract.listStock, async (context, { query }) => {
    if (!stockPolicy.see(context.actor)) throw notFound("stock");
    return pageOf(await listStock(context, query), query.limit, presentStockItem, ({ id }) => [id]);
  });

  write(routes, contract.addStockItem, async (context, { body }) =>
    presentStockItem(await addStockItem(context, body.entry)),
  );

  write(routes, contract.addUsualStock, async (context) => ({ added: await addUsualStock(context) }));

  write(routes, contract.changeStockItem, async (context, { params, body }) =>
    presentStockItem(await changeStockItem(context, { itemId: params.itemId, ...body })),
  );

  write(routes, contract.countStockItem, async (context, { params, body }) =>
    presentStockItem(await countStockItem(context, { itemId: params.itemId, ...body })),
  );

  write(routes, contract.setStockState, async (context, { params, body }) =>
    presentStockItem(await setStockState(context, { itemId: params.itemId, ...body })),
  );
}
