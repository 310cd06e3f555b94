import type { z } from "zod";
import type { sessionSchema } from "#shared/contracts/account.ts";
import type { Session } from "../models/session.ts";

export function presentSession(
  { id, began, createdAt, lastSeenAt, agent }: Session,
  { currentId }: { currentId: string },
): z.input<typeof sessionSchema> {
  return {
    id,
    began,
    createdAt: createdAt.toISOString(),
    lastSeenAt: lastSeenAt.toISOString(),
    agent,
    current: id === currentId,
  };
}
