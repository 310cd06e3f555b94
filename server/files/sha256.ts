import { createHash } from "node:crypto";

/** SHA-256 (FIPS 180-4) of bytes, or of a text as UTF-8, in 64 small hexadecimal digits. */
export function sha256Hex(content: Uint8Array | string): string {
  return createHash("sha256").update(content).digest("hex");
}
