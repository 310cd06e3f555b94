import { useMutation, useQueryClient } from "@tanstack/react-query";
import * as contract from "#shared/contracts/stock.ts";
import type { StockEntry } from "#shared/contracts/stock-entry.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";

/** Every list of the stock, that of the mockup included. */
function useRefresh(shop: string) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: keys.stock(shop) });
}

export function useAddStockItem(shop: string) {
  return useMutation({
    mutationFn: (entry: StockEntry) => call(contract.addStockItem, { params: { shop }, body: { entry } }),
    onSuccess: useRefresh(shop),
  });
}

export function useChangeStockItem(shop: string, itemId: string) {
  return useMutation({
    mutationFn: (body: { version: number; entry: StockEntry }) =>
      call(contract.changeStockItem, { params: { shop, itemId }, body }),
    onSuccess: useRefresh(shop),
  });
}

export function useCountStockItem(shop: string, itemId: string) {
  return useMutation({
    mutationFn: (body: { version: number; quantity: number | null }) =>
      call(contract.countStockItem, { params: { shop, itemId }, body }),
    onSuccess: useRefresh(shop),
  });
}

export function useSetStockState(shop: string) {
  return useMutation({
    mutationFn: ({ itemId, state }: { itemId: string; state: "in stock" | "retired" }) =>
      call(contract.setStockState, { params: { shop, itemId }, body: { state } }),
    onSuccess: useRefresh(shop),
  });
}

export function useAddUsualStock(shop: string) {
  return useMutation({
    mutationFn: () => call(contract.addUsualStock, { params: { shop } }),
    onSuccess: useRefresh(shop),
  });
}
