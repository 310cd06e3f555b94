import { hash, verify } from "@node-rs/argon2";

/** Argon2id with 19 MiB, 2 passes, 1 lane: the smallest setting that OWASP's Password Storage Cheat Sheet names. */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** The password as it is kept. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, cost);
}

let standIn: Promise<string> | undefined;

/**
 * Whether the password is the kept one. Without a kept one the same work is done and the answer is no, so that the
 * time taken tells nobody which addresses are known.
 */
export async function isPassword(kept: string | null, password: string): Promise<boolean> {
  standIn ??= hashPassword("no password of anybody");
  const matches = await verify(kept ?? (await standIn), password);
  return kept !== null && matches;
}
