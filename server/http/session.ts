import { getToken } from "@auth/core/jwt";
import { Op, type Transaction } from "sequelize";
import type { Role } from "#shared/contracts/account.ts";
import type { Environment } from "../env.ts";
import { Client } from "../models/client.ts";
import { Contact } from "../models/contact.ts";
import { Membership } from "../models/membership.ts";
import { Person } from "../models/person.ts";
import { Session } from "../models/session.ts";
import { Shop } from "../models/shop.ts";
import { type Actor, type Insider, isInsider } from "../policies/actor.ts";

export type LiveSession = { readonly session: Session; readonly person: Person };

/** Secure cookies exactly when people reach us by https; sign-in and reading must agree on the name. */
export const usesSecureCookies = (env: Environment): boolean => env.PUBLIC_URL.startsWith("https:");
export const sessionCookieNames = ["__Secure-authjs.session-token", "authjs.session-token"] as const;
export const sessionCookie = (env: Environment): string => sessionCookieNames[usesSecureCookies(env) ? 0 : 1];

/**
 * The session's row is what counts: ended or run out means signed out at once, whatever the cookie says. `isUse`: whether somebody does
 * something by it, which keeps it from running out.
 */
export async function liveSession(sessionId: string, now: Date, { isUse = true } = {}): Promise<LiveSession | null> {
  const session = await Session.findOne({ where: { id: sessionId, endedAt: null, expiresAt: { [Op.gt]: now } } });
  if (!session) return null;
  const person = await Person.findByPk(session.personId);
  if (!person) return null;
  if (isUse && now.getTime() - session.lastSeenAt.getTime() > touchAfterMs) {
    // Never undoes an ending that another request has just written.
    await Session.update(
      {
        lastSeenAt: now,
        expiresAt: sessionExpiry({ began: session.began, createdAt: session.createdAt, seenAt: now }),
      },
      { where: { id: session.id, endedAt: null } },
    );
  }
  return { session, person };
}

/** How exactly "last seen" is kept: a write for each request would be too many. */
const touchAfterMs = 60_000;
const hourMs = 3_600_000;

/**
 * When a session ends by itself. By password: 12 hours after it was last used, 14 days after it began at the latest.
 * By a mailed link: 30 days after it began.
 */
export function sessionExpiry({
  began,
  createdAt,
  seenAt,
}: {
  began: Session["began"];
  createdAt: Date;
  seenAt: Date;
}): Date {
  if (began === "link") return new Date(createdAt.getTime() + 30 * 24 * hourMs);
  return new Date(Math.min(seenAt.getTime() + 12 * hourMs, createdAt.getTime() + 14 * 24 * hourMs));
}

/** Whether a session speaks for clients: its holder was shown to read the address that the contact has. */
const speaksForClients = ({ session, person }: LiveSession): boolean =>
  session.began === "link" || person.addressProvenAt !== null;

type WithCookie = { readonly headers: { readonly cookie?: string | undefined } };

/** Who sent the request, read from the encrypted cookie and then from the session's row. */
export async function readSession(
  request: WithCookie,
  env: Environment,
  now: Date,
  use: { isUse?: boolean } = {},
): Promise<LiveSession | null> {
  if (!request.headers.cookie) return null;
  const cookieName = sessionCookie(env);
  const token = await getToken({
    req: { headers: { cookie: request.headers.cookie } },
    secret: env.AUTH_SECRET,
    cookieName,
    salt: cookieName,
    secureCookie: usesSecureCookies(env),
  });
  return typeof token?.sessionId === "string" ? liveSession(token.sessionId, now, use) : null;
}

/**
 * The actor of a session at an address. A session begun by a mailed link acts for a client only: whoever reads a
 * client's mail must not become staff by it.
 */
export async function actorAt(
  live: LiveSession | null,
  shopId: string | null,
  transaction?: Transaction,
): Promise<Actor> {
  const within = transaction ? { transaction } : {};
  if (!live) return { kind: "nobody" };
  const { session, person } = live;
  const who = { personId: person.id, name: person.name, sessionId: session.id };
  if (!shopId) return { kind: "person", ...who };
  if (session.began === "password") {
    const membership = await Membership.findOne({ where: { shopId, personId: person.id, endedAt: null }, ...within });
    if (membership) return { kind: "staff", ...who, shopId, membershipId: membership.id, role: membership.role };
  }
  const contacts = speaksForClients(live)
    ? await Contact.findAll({ where: { shopId, personId: person.id, endedAt: null }, order: ["id"], ...within })
    : [];
  if (contacts.length === 0) return { kind: "person", ...who };
  return {
    kind: "contact",
    ...who,
    name: contacts[0]?.name ?? person.name,
    shopId,
    contacts: contacts.map(({ id, clientId, name }) => ({ contactId: id, clientId, name })),
  };
}

/** The actors that a session makes, one for each shop it opens. */
export async function placesIn(live: LiveSession, transaction: Transaction): Promise<Insider[]> {
  const where = { personId: live.person.id, endedAt: null };
  const rows = [
    ...(await Membership.findAll({ where, attributes: ["shopId"], transaction })),
    ...(await Contact.findAll({ where, attributes: ["shopId"], transaction })),
  ];
  const shopIds = new Set(rows.map(({ shopId }) => shopId));
  const actors = await Promise.all([...shopIds].map((shopId) => actorAt(live, shopId, transaction)));
  return actors.filter(isInsider);
}

export type Places = {
  readonly memberOf: readonly { shop: string; shopName: string; role: Role }[];
  readonly contactOf: readonly { shop: string; shopName: string; client: string }[];
};

/** Every place the session opens. */
export async function placesOf(live: LiveSession, transaction?: Transaction): Promise<Places> {
  const within = transaction ? { transaction } : {};
  const { session, person } = live;
  const memberships =
    session.began === "password"
      ? await Membership.findAll({
          where: { personId: person.id, endedAt: null },
          include: [{ model: Shop, as: "shop" }],
          order: ["createdAt", "id"],
          ...within,
        })
      : [];
  const contacts = speaksForClients(live)
    ? await Contact.findAll({
        where: { personId: person.id, endedAt: null },
        include: [
          { model: Shop, as: "shop" },
          { model: Client, as: "client" },
        ],
        order: ["createdAt", "id"],
        ...within,
      })
    : [];
  return {
    memberOf: memberships.flatMap(({ role, shop }) => (shop ? [{ shop: shop.slug, shopName: shop.name, role }] : [])),
    contactOf: contacts.flatMap(({ shop, client }) =>
      shop && client ? [{ shop: shop.slug, shopName: shop.name, client: client.name }] : [],
    ),
  };
}
