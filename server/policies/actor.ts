import type { Role } from "#shared/contracts/account.ts";

/**
 * Who asks, in the place that the page's address names. Made anew for each request from the session's row
 * and the memberships of that moment; nothing of it is kept in a token.
 */
export type Actor =
  | { readonly kind: "nobody" }
  /** Signed in, without a place in the shop of this address (or at an address without a shop). */
  | { readonly kind: "person"; readonly personId: string; readonly name: string; readonly sessionId: string }
  | {
      readonly kind: "staff";
      readonly personId: string;
      readonly name: string;
      readonly sessionId: string;
      readonly shopId: string;
      readonly membershipId: string;
      readonly role: Role;
    }
  | {
      readonly kind: "contact";
      readonly personId: string;
      readonly name: string;
      readonly sessionId: string;
      readonly shopId: string;
      /** One person may be the contact of several clients of a shop. */
      readonly contacts: readonly { readonly contactId: string; readonly clientId: string; readonly name: string }[];
    };

export type Staff = Extract<Actor, { kind: "staff" }>;
export type ContactActor = Extract<Actor, { kind: "contact" }>;
/** Someone with a place in the shop. */
export type Insider = Staff | ContactActor;

export function isStaff(actor: Actor, ...roles: readonly Role[]): actor is Staff {
  return actor.kind === "staff" && (roles.length === 0 || roles.includes(actor.role));
}

export function isInsider(actor: Actor): actor is Insider {
  return actor.kind === "staff" || actor.kind === "contact";
}

/** The actor's name as that client's people know it: one person may be written differently at two clients. */
export function nameAt(actor: Insider, clientId: string): string {
  return contactAt(actor, clientId)?.name ?? actor.name;
}

/** The actor's contact at that client, if there is one. */
export function contactAt(
  actor: Actor,
  clientId: string,
): { contactId: string; clientId: string; name: string } | null {
  return actor.kind === "contact" ? (actor.contacts.find((contact) => contact.clientId === clientId) ?? null) : null;
}
