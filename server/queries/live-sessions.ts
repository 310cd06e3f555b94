import { Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import type { LiveSession } from "../http/session.ts";
import { Person } from "../models/person.ts";
import { Session } from "../models/session.ts";

const live = (personId: string, now: Date) => ({ personId, endedAt: null, expiresAt: { [Op.gt]: now } });

/** Where a person is signed in, the newest first; what nobody could need more than a hundred of. */
export function liveSessionsOf({ now, transaction }: ReadContext, personId: string): Promise<Session[]> {
  const order: [string, string][] = [
    ["createdAt", "DESC"],
    ["id", "DESC"],
  ];
  return Session.findAll({ where: live(personId, now), order, limit: 100, transaction });
}

/** One live session of a person; null when it is someone else's, or ended. */
export function liveSessionOf(
  { now, transaction }: ReadContext,
  { personId, sessionId }: { personId: string; sessionId: string },
): Promise<Session | null> {
  return Session.findOne({ where: { ...live(personId, now), id: sessionId }, transaction });
}

/** The session a request came with and its person; null when nobody is signed in. */
export async function ownSession(context: ReadContext): Promise<LiveSession | null> {
  const { actor, transaction } = context;
  if (actor.kind === "nobody") return null;
  const session = await liveSessionOf(context, actor);
  const person = session && (await Person.findByPk(session.personId, { transaction }));
  return session && person ? { session, person } : null;
}
