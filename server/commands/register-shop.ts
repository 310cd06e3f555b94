import { type Transaction, UniqueConstraintError } from "sequelize";
import { hashPassword, isPassword } from "../auth/passwords.ts";
import { newId } from "../db/new-id.ts";
import { AppError } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Membership } from "../models/membership.ts";
import { Person } from "../models/person.ts";
import { Shop } from "../models/shop.ts";
import { loadStandardStock } from "./load-standard-stock.ts";
import { logEvent } from "./log-event.ts";

/**
 * Opens a shop, owned by whoever asks. An address that is known already needs its own password: a client's contact must
 * not be taken over by registering with their address.
 */
export async function registerShop(
  context: Context,
  input: { shopName: string; name: string; email: string; password: string },
): Promise<Shop> {
  const { now, transaction } = context;
  const person = await founder(context, input);
  // Two shops of one name at once would otherwise get the same address.
  await context.services.sequelize.query("select pg_advisory_xact_lock(hashtext('shop addresses'))", { transaction });
  const shop = await Shop.create(
    {
      id: newId(),
      slug: await freeSlug(input.shopName, transaction),
      name: input.shopName,
      unit: "mm",
      jobPrefix: prefixOf(input.shopName),
      paper: "A4",
      createdAt: now,
    },
    { transaction },
  );
  await loadStandardStock({ shopId: shop.id, now, transaction });
  const membership = { id: newId(), shopId: shop.id, personId: person.id, role: "owner" as const, createdAt: now };
  await Membership.create(membership, { transaction });
  const actor = { kind: "person", personId: person.id, name: person.name, sessionId: "" } as const;
  await logEvent({ actor, now, transaction }, { shopId: shop.id, kind: "shop opened", data: { name: shop.name } });
  return shop;
}

async function founder(
  { now, transaction }: Context,
  { name, email, password }: { name: string; email: string; password: string },
): Promise<Person> {
  const known = await Person.findOne({ where: { email }, transaction });
  if (known) {
    if (await isPassword(known.passwordHash, password)) return known;
    throw addressKnown();
  }
  const person = { id: newId(), email, name, passwordHash: await hashPassword(password), createdAt: now };
  return Person.create(person, { transaction }).catch((error: unknown) => {
    // Someone else came first with this address.
    throw error instanceof UniqueConstraintError ? addressKnown() : error;
  });
}

const addressKnown = (): AppError =>
  new AppError("already_exists", {
    detail:
      "This address has an account here. Use its password, or ask for a new one on the sign-in page, and then open your shop.",
    errors: [{ pointer: "/email", detail: "This address has an account here." }],
  });

/** An address for the shop: its name in plain letters, with a number when that is taken. */
async function freeSlug(name: string, transaction: Transaction): Promise<string> {
  const plain = plainLetters(name)
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, "-")
    .slice(0, 50)
    .replace(/^-+|-+$/g, "");
  const base = plain || "shop";
  for (let number = 1; ; number += 1) {
    const slug = number === 1 ? base : `${base}-${number}`;
    if ((await Shop.count({ where: { slug }, transaction })) === 0) return slug;
  }
}

/** Without accents: Ü as U. */
const plainLetters = (text: string): string => text.normalize("NFKD").replace(/\p{M}/gu, "");

/** The initials of the name's words, as CL for Copper Lark; J for job when there are none. */
function prefixOf(name: string): string {
  const initials = plainLetters(name)
    .toUpperCase()
    .split(/[^A-Z]+/)
    .map((word) => word.slice(0, 1))
    .join("");
  return initials.slice(0, 3) || "J";
}
