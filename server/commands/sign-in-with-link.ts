import { AppError } from "../http/app-error.ts";
import type { Services } from "../http/context.ts";
import { Contact } from "../models/contact.ts";
import { Person } from "../models/person.ts";
import { type Browser, beginSession } from "./begin-session.ts";
import { logEvent } from "./log-event.ts";
import { spendLink } from "./spend-link.ts";

/** Spends a mailed link and begins a session for its contact; null when the link does not hold any more. */
export async function signInWithLink(
  { sequelize }: Services,
  { token, ...browser }: { token: string } & Browser,
): Promise<{ id: string; sessionId: string } | null> {
  const now = new Date();
  try {
    return await sequelize.transaction(async (transaction) => {
      const link = await spendLink({ now, transaction }, { token, purpose: "sign in" });
      const contact =
        link.contactId && (await Contact.findOne({ where: { id: link.contactId, endedAt: null }, transaction }));
      const person = contact && (await Person.findByPk(contact.personId, { transaction }));
      // The contact may have been removed, or given another address, since the mail went out.
      if (!contact || !person || person.email !== link.address) throw new AppError("link_expired");
      const session = await beginSession({ now, transaction }, { personId: person.id, began: "link", ...browser });
      const { id: contactId, shopId, clientId, name } = contact;
      const actor = {
        kind: "contact",
        personId: person.id,
        name,
        sessionId: session.id,
        shopId,
        contacts: [{ contactId, clientId, name }],
      } as const;
      await logEvent({ actor, now, transaction }, { shopId, kind: "signed in", data: { by: "link" } });
      return { id: person.id, sessionId: session.id };
    });
  } catch (error) {
    if (error instanceof AppError) return null;
    throw error;
  }
}
