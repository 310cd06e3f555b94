import canonicalize from "canonicalize";

/** The one spelling of a JSON value (RFC 8785), so that its hash does not depend on who wrote it. Throws for what JSON can't hold. */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new Error("Nothing can't be written as JSON.");
  return text;
}
