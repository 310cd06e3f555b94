import { getToken } from "@auth/core/jwt";
import type { Request } from "express";
import { Op } from "sequelize";
import type { Role } from "#shared/contracts/account.ts";
import type { Environment } from "../env.ts";
import { Client } from "../models/client.ts";
import { Contact } from "../models/contact.ts";
import { Membership } from "../models/membership.ts";
import { Person } from "../models/person.ts";
import { Session } from "../models/session.ts";
import { Shop } from "../models/shop.ts";
import type { Actor } from "../policies/actor.ts";

export type LiveSession = { readonly session: Session; readonly person: Person };

/** Secure cookies exactly when people reach us by https; sign-in and reading must agree on the name. */
export const usesSecureCookies = (env: Environment): boolean => env.PUBLIC_URL.startsWith("https:");
export const sessionCookie = (env: Environment): string =>
  usesSecureCookies(env) ? "__Secure-authjs.session-token" : "authjs.session-token";

/** The session's row is what counts: ended or run out means signed out at once, whatever the cookie says. */
export async function liveSession(sessionId: string, now: Date): Promise<LiveSession | null> {
  const session = await Session.findOne({ where: { id: sessionId, endedAt: null, expiresAt: { [Op.gt]: now } } });
  if (!session) return null;
  const person = await Person.findByPk(session.personId);
  return person ? { session, person } : null;
}

/** Who sent the request, read from the encrypted cookie and then from the session's row. */
export async function readSession(request: Request, env: Environment, now: Date): Promise<LiveSession | null> {
  if (!request.headers.cookie) return null;
  const cookieName = sessionCookie(env);
  const token = await getToken({
    req: { headers: { cookie: request.headers.cookie } },
    secret: env.AUTH_SECRET,
    cookieName,
    salt: cookieName,
    secureCookie: usesSecureCookies(env),
  });
  return typeof token?.sessionId === "string" ? liveSession(token.sessionId, now) : null;
}

/**
 * The actor of a session at an address. A session begun by a mailed link acts for a client only: whoever reads a
 * client's mail must not become staff by it.
 */
export async function actorAt(live: LiveSession | null, shopId: string | null): Promise<Actor> {
  if (!live) return { kind: "nobody" };
  const { session, person } = live;
  const who = { personId: person.id, name: person.name, sessionId: session.id };
  if (!shopId) return { kind: "person", ...who };
  if (session.began === "password") {
    const membership = await Membership.findOne({ where: { shopId, personId: person.id, endedAt: null } });
    if (membership) return { kind: "staff", ...who, shopId, membershipId: membership.id, role: membership.role };
  }
  const contacts = await Contact.findAll({ where: { shopId, personId: person.id, endedAt: null }, order: ["id"] });
  if (contacts.length === 0) return { kind: "person", ...who };
  return {
    kind: "contact",
    ...who,
    name: contacts[0]?.name ?? person.name,
    shopId,
    contacts: contacts.map(({ id, clientId, name }) => ({ contactId: id, clientId, name })),
  };
}

export type Places = {
  readonly memberOf: readonly { shop: string; shopName: string; role: Role }[];
  readonly contactOf: readonly { shop: string; shopName: string; client: string }[];
};

/** Every place the session opens. */
export async function placesOf({ session, person }: LiveSession): Promise<Places> {
  const memberships =
    session.began === "password"
      ? await Membership.findAll({
          where: { personId: person.id, endedAt: null },
          include: [{ model: Shop, as: "shop" }],
          order: ["createdAt", "id"],
        })
      : [];
  const contacts = await Contact.findAll({
    where: { personId: person.id, endedAt: null },
    include: [
      { model: Shop, as: "shop" },
      { model: Client, as: "client" },
    ],
    order: ["createdAt", "id"],
  });
  return {
    memberOf: memberships.flatMap(({ role, shop }) => (shop ? [{ shop: shop.slug, shopName: shop.name, role }] : [])),
    contactOf: contacts.flatMap(({ shop, client }) =>
      shop && client ? [{ shop: shop.slug, shopName: shop.name, client: client.name }] : [],
    ),
  };
}
