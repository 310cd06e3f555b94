import { Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import type { LiveSession } from "../http/session.ts";
import { Person } from "../models/person.ts";
import { Session } from "../models/session.ts";

const live = (personId: string, now: Date) => ({ personId, endedAt: null, expiresAt: { [Op.gt]: now } });

/**
 * A session looks after its like only until its person has shown both the password and the mail: whoever reads a client's
 * mail is not yet its person, nor is whoever typed an address.
 */
const within = ({ person, session }: LiveSession, now: Date) => ({
  ...live(person.id, now),
  ...(session.began === "link" || person.addressProvenAt === null ? { began: session.began } : {}),
});

/** Where the person of a session is signed in, the newest first; nobody needs more than a hundred. */
export function liveSessionsOf({ now, transaction }: ReadContext, own: LiveSession): Promise<Session[]> {
  const order: [string, string][] = [
    ["createdAt", "DESC"],
    ["id", "DESC"],
  ];
  return Session.findAll({ where: within(own, now), order, limit: 100, transaction });
}

/** One of them; null when it is someone else's, or ended. */
export function liveSessionOf(
  { now, transaction }: ReadContext,
  own: LiveSession,
  sessionId: string,
): Promise<Session | null> {
  return Session.findOne({ where: { ...within(own, now), id: sessionId }, transaction });
}

/** The session a request came with and its person; null when nobody is signed in. */
export async function ownSession(context: ReadContext): Promise<LiveSession | null> {
  const { actor, now, transaction } = context;
  if (actor.kind === "nobody") return null;
  const session = await Session.findOne({ where: { ...live(actor.personId, now), id: actor.sessionId }, transaction });
  const person = session && (await Person.findByPk(session.personId, { transaction }));
  return session && person ? { session, person } : null;
}
