import { describe, expect, it } from "vitest";
import { findCopiedText, keepCopied } from "@/features/mockup/editor/copy-shelf.ts";
import type { Copied } from "@/features/mockup/model/copied.ts";
import { emptyMockup } from "../sample-mockup.ts";

const place = { personId: "ann", shop: "plum", clientId: "orrery" };
const copied: Copied = { wholeKeys: ["B"], document: emptyMockup() };

/** A store of a browser; `room` is how many characters it takes. */
function storeOf(room: number): Storage {
  const kept = new Map<string, string>();
  return {
    get length() {
      return kept.size;
    },
    key: (index) => [...kept.keys()][index] ?? null,
    getItem: (key) => kept.get(key) ?? null,
    setItem: (key, text) => {
      if (text.length > room) throw new DOMException("no room", "QuotaExceededError");
      kept.set(key, text);
    },
    removeItem: (key) => void kept.delete(key),
    clear: () => kept.clear(),
  };
}

describe("what is kept of a copy in the browser", () => {
  it("is found by the same person for the same client of the same shop, and by nobody else", () => {
    const storage = storeOf(100_000);
    expect(findCopiedText(storage, place)).toBeNull();
    expect(keepCopied(storage, place, copied)).toBe(true);
    expect(findCopiedText(storage, place)).toContain('"wholeKeys":["B"]');
    for (const other of [{ personId: "bob" }, { shop: "quince" }, { clientId: "planet" }])
      expect(findCopiedText(storage, { ...place, ...other })).toBeNull();
  });

  it("is not kept where there is no room, or where pages may keep nothing", () => {
    const storage = storeOf(10);
    expect(keepCopied(storage, place, copied)).toBe(false);
    expect(findCopiedText(storage, place)).toBeNull();
    expect(keepCopied(null, place, copied)).toBe(false);
    expect(findCopiedText(null, place)).toBeNull();
  });
});
