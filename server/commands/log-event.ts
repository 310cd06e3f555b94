import type { Context } from "../http/context.ts";
import { Event, type EventFacts, type EventKind } from "../models/event.ts";

/** Writes to the shop's log, which is only ever added to. `who` is the actor's name as it was then. */
export async function logEvent<K extends EventKind>(
  context: Pick<Context, "actor" | "now" | "transaction">,
  { shopId, jobId = null, kind, data }: { shopId: string; jobId?: string | null; kind: K; data: EventFacts[K] },
): Promise<void> {
  const { actor, now, transaction } = context;
  const side = actor.kind === "contact" ? "client" : actor.kind === "nobody" ? "guest" : "shop";
  await Event.create(
    {
      shopId,
      jobId,
      at: now,
      kind,
      side,
      personId: actor.kind === "nobody" ? null : actor.personId,
      who: actor.kind === "nobody" ? "A guest" : actor.name,
      data,
    },
    { transaction },
  );
}

/** The same for what no person did: the queue, the clock. */
export async function logSystemEvent<K extends EventKind>(
  { now, transaction }: Pick<Context, "now" | "transaction">,
  { shopId, jobId = null, kind, data }: { shopId: string; jobId?: string | null; kind: K; data: EventFacts[K] },
): Promise<void> {
  await Event.create(
    { shopId, jobId, at: now, kind, side: "system", personId: null, who: "Standproud", data },
    { transaction },
  );
}
