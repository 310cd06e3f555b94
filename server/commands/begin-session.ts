import type { Transaction } from "sequelize";
import { newId } from "../db/new-id.ts";
import { sessionExpiry } from "../http/session.ts";
import { Session } from "../models/session.ts";
import { endSession } from "./end-session.ts";

export type Browser = {
  readonly agent: string;
  /** The session that the browser's cookie held until now. */
  readonly replaces: string | null;
};

/** Begins a session; the one it takes the place of ends, since nobody holds its cookie any more, or somebody should not. */
export async function beginSession(
  { now, transaction }: { now: Date; transaction: Transaction },
  { personId, began, agent, replaces }: { personId: string; began: Session["began"] } & Browser,
): Promise<Session> {
  if (replaces) await endSession({ sessionId: replaces, now, transaction });
  return Session.create(
    {
      id: newId(),
      personId,
      began,
      agent,
      createdAt: now,
      lastSeenAt: now,
      expiresAt: sessionExpiry({ began, createdAt: now, seenAt: now }),
    },
    { transaction },
  );
}
