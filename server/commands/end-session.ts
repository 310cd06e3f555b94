import type { Transaction } from "sequelize";
import { Session } from "../models/session.ts";

/** Ends one session at once. Ending it again changes nothing. */
export async function endSession({
  sessionId,
  now,
  transaction,
}: {
  sessionId: string;
  now: Date;
  transaction?: Transaction | undefined;
}): Promise<void> {
  await Session.update(
    { endedAt: now },
    { where: { id: sessionId, endedAt: null }, ...(transaction ? { transaction } : {}) },
  );
}
