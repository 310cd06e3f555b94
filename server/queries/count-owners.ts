import type { Transaction } from "sequelize";
import { Membership } from "../models/membership.ts";

/** How many owners a shop has now. */
export function countOwners(shopId: string, transaction?: Transaction): Promise<number> {
  return Membership.count({ where: { shopId, role: "owner", endedAt: null }, ...(transaction ? { transaction } : {}) });
}
