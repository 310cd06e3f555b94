import { AppError } from "./app-error.ts";

/** Of one shop: how many changes run at once, each with a connection of its own, and how many more may wait for that. */
export const laneLimits = { atOnce: 4, waiting: 40 } as const;

type Lane = { running: number; readonly waiting: (() => void)[] };

const lanes = new Map<string, Lane>();

/**
 * Runs a change when fewer than `atOnce` of its shop are running, first come first served. Changes of one job wait for each
 * other with a connection in hand; without lanes a single shop could so take every connection there is from all others.
 * Throws too_many_requests when too many wait.
 */
export async function inShopLane<T>(shopId: string, change: () => Promise<T>): Promise<T> {
  const lane = lanes.get(shopId) ?? { running: 0, waiting: [] };
  lanes.set(shopId, lane);
  if (lane.running < laneLimits.atOnce) lane.running += 1;
  else if (lane.waiting.length < laneLimits.waiting) await new Promise<void>((resolve) => lane.waiting.push(resolve));
  else
    throw new AppError("too_many_requests", {
      detail: "Your shop is changing too much at once. Try again in a minute; nothing that was saved is lost.",
    });
  try {
    return await change();
  } finally {
    // Whoever waits takes over this one's place.
    const next = lane.waiting.shift();
    if (next) next();
    else {
      lane.running -= 1;
      if (lane.running === 0) lanes.delete(shopId);
    }
  }
}
