/** Who waits in a line, by shop, so that no shop fills it alone. */
export type ShopLine = {
  /** How many of this shop wait or are being served. */
  readonly of: (shopId: string) => number;
  /** Runs something that waits in the line for this shop, and counts it as long. */
  readonly stand: <T>(shopId: string, wait: () => Promise<T>) => Promise<T>;
};

/** A line in which nobody stands yet. */
export function shopLine(): ShopLine {
  const counts = new Map<string, number>();
  const of = (shopId: string): number => counts.get(shopId) ?? 0;
  return {
    of,
    async stand(shopId, wait) {
      counts.set(shopId, of(shopId) + 1);
      try {
        return await wait();
      } finally {
        const left = of(shopId) - 1;
        if (left > 0) counts.set(shopId, left);
        else counts.delete(shopId);
      }
    },
  };
}
