import type { Logger } from "pino";
import type { Sequelize, Transaction } from "sequelize";
import type { Environment } from "../env.ts";
import type { Storage } from "../files/storage.ts";
import type { Watchers } from "../live/watchers.ts";
import type { MailSink } from "../mail/sink.ts";
import type { Actor } from "../policies/actor.ts";

/** What the process holds for all requests and jobs. */
export type Services = {
  readonly env: Environment;
  readonly sequelize: Sequelize;
  readonly storage: Storage;
  /** The local sink while no mail server is configured. */
  readonly mailSink: MailSink | null;
  /** Who looks at a job in this process, to be told what changes. */
  readonly watchers: Watchers;
  readonly log: Logger;
};

/** A read: no transaction of its own, so `transaction` is undefined and passed on all the same. */
export type ReadContext = {
  readonly services: Services;
  readonly actor: Actor;
  /** The shop of the address, when the actor has a place in it or the address is public. */
  readonly shop: { readonly id: string; readonly slug: string } | null;
  readonly now: Date;
  readonly requestId: string;
  readonly address: string;
  readonly agent: string;
  readonly log: Logger;
  readonly transaction?: Transaction | undefined;
};

/** A change: one transaction, committed before the answer is sent. */
export type Context = ReadContext & { readonly transaction: Transaction };

/** The shop of the address. Routes that only insiders reach always have one. */
export function shopIdOf({ shop }: Pick<ReadContext, "shop">): string {
  if (!shop) throw new Error("This address names no shop.");
  return shop.id;
}
