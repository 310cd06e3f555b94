import type { MockupDocument } from "./document.ts";

/** B to Z, then BA, BB …: A is the backer's. I and O are left out, they read as 1 and 0 (common practice, no source). */
const letters = "ABCDEFGHJKLMNPQRSTUVWXYZ".split("");
const keys = [
  ...letters.slice(1),
  ...letters.slice(1).flatMap((first) => letters.map((second) => `${first}${second}`)),
];

/** The first `count` keys that no layer of the document has. */
export function nextFreeKeys(document: MockupDocument, count: number): string[] {
  const taken = new Set(document.layers.map((layer) => layer.key));
  return keys.filter((key) => !taken.has(key)).slice(0, count);
}
