import type { Transaction } from "sequelize";
import type { z } from "zod";
import type { meSchema } from "#shared/contracts/account.ts";
import { type LiveSession, placesOf } from "../http/session.ts";

/** Who is signed in, and every place the session opens; nobody when there is none. */
export async function presentMe(
  live: LiveSession | null,
  transaction?: Transaction,
): Promise<z.input<typeof meSchema>> {
  if (!live) return { person: null, session: null, memberOf: [], contactOf: [] };
  const { person, session } = live;
  const { memberOf, contactOf } = await placesOf(live, transaction);
  return {
    person: { id: person.id, name: person.name, email: person.email, hasPassword: person.passwordHash !== null },
    session: session.began,
    memberOf: [...memberOf],
    contactOf: [...contactOf],
  };
}
