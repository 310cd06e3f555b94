import { DatabaseError, type Transaction } from "sequelize";
import { AppError } from "./app-error.ts";
import type { ReadContext } from "./context.ts";
import { inShopLane } from "./shop-lane.ts";

/** How long a change waits for a row that another one holds. A usual sign is frozen in a fraction of that. */
const lockWait = "10s";
/** PostgreSQL's lock_not_available (appendix A of its manual). */
const lockNotAvailable = "55P03";

/**
 * A change in one transaction, in the lane of the shop it is made at. Throws too_many_requests in words when what it
 * changes is held by somebody else for long: a request that waits keeps a connection from everybody.
 */
export async function asOneChange<T>(
  { services: { sequelize }, shop }: Pick<ReadContext, "services" | "shop">,
  change: (transaction: Transaction) => Promise<T>,
): Promise<T> {
  const run = () =>
    sequelize.transaction(async (transaction) => {
      await sequelize.query(`set local lock_timeout = '${lockWait}'`, { transaction });
      return change(transaction);
    });
  try {
    return await (shop ? inShopLane(shop.id, run) : run());
  } catch (error) {
    if (!isLockedOut(error)) throw error;
    throw new AppError("too_many_requests", {
      detail: "This is being worked on right now, and that takes long. Try again in a minute; nothing is lost.",
    });
  }
}

const isLockedOut = (error: unknown): boolean =>
  error instanceof DatabaseError && "code" in error.original && error.original.code === lockNotAvailable;
