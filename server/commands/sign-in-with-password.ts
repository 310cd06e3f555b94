import { isPassword } from "../auth/passwords.ts";
import type { Services } from "../http/context.ts";
import { placesIn } from "../http/session.ts";
import { Person } from "../models/person.ts";
import { type Browser, beginSession } from "./begin-session.ts";
import { logEvent } from "./log-event.ts";

/** Begins a session for an address and its password; null, after the same time, when they do not belong together. */
export async function signInWithPassword(
  { sequelize }: Services,
  { email, password, ...browser }: { email: string; password: string } & Browser,
): Promise<{ id: string; sessionId: string } | null> {
  const person = await Person.findOne({ where: { email } });
  const matches = await isPassword(person?.passwordHash ?? null, password);
  if (!person || !matches) return null;
  return sequelize.transaction(async (transaction) => {
    // A change of the password ends all sessions; one that began beside it would outlive it.
    const where = { id: person.id, passwordHash: person.passwordHash };
    if (!(await Person.findOne({ where, lock: transaction.LOCK.SHARE, transaction }))) return null;
    const now = new Date();
    const session = await beginSession({ now, transaction }, { personId: person.id, began: "password", ...browser });
    for (const actor of await placesIn({ session, person }, transaction)) {
      await logEvent(
        { actor, now, transaction },
        { shopId: actor.shopId, kind: "signed in", data: { by: "password" } },
      );
    }
    return { id: person.id, sessionId: session.id };
  });
}
