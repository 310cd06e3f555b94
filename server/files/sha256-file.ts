import { createHash } from "node:crypto";
import { createReadStream } from "node:fs";

/** SHA-256 of a file as 64 hexadecimal digits, without holding it in memory. */
export async function sha256OfFile(path: string): Promise<string> {
  const hash = createHash("sha256");
  for await (const chunk of createReadStream(path)) hash.update(chunk);
  return hash.digest("hex");
}
