import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { z } from "zod";
import { sha256Hex } from "#server/files/sha256.ts";
import { sha256 as sha256InPage } from "#shared/lettering/sha-256.ts";

// NIST FIPS 180-4 with its example messages.
const { sha256 } = z
  .object({ sha256: z.array(z.object({ message: z.string(), repeat: z.number(), digest: z.string() })) })
  .parse(JSON.parse(readFileSync(new URL("../fixtures/reference/test-vectors.json", import.meta.url), "utf8")));

it("the table has its four messages", () => {
  expect(sha256).toHaveLength(4);
});

it.each(sha256)("SHA-256 of $repeat × $message", ({ message, repeat, digest }) => {
  const text = message.repeat(repeat);
  expect(sha256Hex(text)).toBe(digest);
  expect(sha256Hex(new TextEncoder().encode(text))).toBe(digest);
  expect(sha256InPage(new TextEncoder().encode(text))).toBe(digest);
});
