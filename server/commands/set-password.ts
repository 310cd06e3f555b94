import { hashPassword, isPassword } from "../auth/passwords.ts";
import { AppError, invalid } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Person } from "../models/person.ts";
import { endSessionsOf } from "./end-sessions.ts";
import { killLinks } from "./kill-links.ts";
import { spendLink } from "./spend-link.ts";

/** Sets a new password by a mailed link, which also proves the address. Every session of the person ends. */
export async function resetPassword(
  context: Context,
  { token, password }: { token: string; password: string },
): Promise<Person> {
  const { now, transaction } = context;
  const link = await spendLink(context, { token, purpose: "new password" });
  const person = link.personId && (await Person.findByPk(link.personId, { transaction }));
  if (!person || person.email !== link.address) throw new AppError("link_expired");
  await person.update({ passwordHash: await hashPassword(password), addressProvenAt: now }, { transaction });
  await killLinks(context, { personId: person.id, purpose: "new password" });
  await endSessionsOf(context, { personId: person.id });
  return person;
}

/** Changes one's own password. Every other session of the person ends. */
export async function changePassword(
  context: Context,
  {
    personId,
    sessionId,
    current,
    password,
  }: { personId: string; sessionId: string; current: string; password: string },
): Promise<void> {
  const { transaction } = context;
  const person = await Person.findByPk(personId, { lock: transaction.LOCK.UPDATE, transaction });
  if (!person || !(await isPassword(person.passwordHash, current))) {
    throw invalid([{ pointer: "/current", detail: "That is not your password now." }]);
  }
  await person.update({ passwordHash: await hashPassword(password) }, { transaction });
  await killLinks(context, { personId, purpose: "new password" });
  // Whoever has not shown that they read the mail does not sign out those who do.
  const among = person.addressProvenAt ? {} : ({ began: "password" } as const);
  await endSessionsOf(context, { personId, except: sessionId, ...among });
}
