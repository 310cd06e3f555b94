import { createHash, randomBytes } from "node:crypto";

/** The secret of a link: 32 random bytes as 43 characters of base64url. */
export const newToken = (): string => randomBytes(32).toString("base64url");

/** What is kept of it. The token has 256 random bits, so one plain pass of SHA-256 can't be searched backwards. */
export const tokenHash = (token: string): string => createHash("sha256").update(token).digest("hex");
