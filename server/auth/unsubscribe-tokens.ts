import { createHmac } from "node:crypto";
import type { Transaction } from "sequelize";
import type { Environment } from "../env.ts";
import { UnsubscribeToken } from "../models/unsubscribe-token.ts";
import { tokenHash } from "./tokens.ts";

export type Subscriber = { readonly personId: string; readonly shopId: string };

/**
 * The token in a person's mails of one shop: 256 bits that only the server's secret tells, so that every mail can carry it while the
 * database holds no more than its hash. It stops mail and does nothing else, and never runs out.
 */
export const unsubscribeToken = (
  { AUTH_SECRET }: Pick<Environment, "AUTH_SECRET">,
  { personId, shopId }: Subscriber,
): string => createHmac("sha256", AUTH_SECRET).update(`unsubscribe ${personId} ${shopId}`).digest("base64url");

/** The same, to be found again when it comes back. With another secret the tokens made before go on working. */
export async function issueUnsubscribeToken(
  env: Pick<Environment, "AUTH_SECRET">,
  whom: Subscriber,
  { now, transaction }: { now: Date; transaction: Transaction },
): Promise<string> {
  const token = unsubscribeToken(env, whom);
  await UnsubscribeToken.bulkCreate([{ tokenHash: tokenHash(token), ...whom, createdAt: now }], {
    ignoreDuplicates: true,
    transaction,
  });
  return token;
}
