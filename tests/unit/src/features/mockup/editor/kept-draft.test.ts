// @vitest-environment jsdom
import { beforeEach, describe, expect, it } from "vitest";
import { dropDraft, findDraft, keepDraft } from "@/features/mockup/editor/kept-draft.ts";
import { emptyMockup } from "../sample-mockup.ts";

const place = { personId: "p1", shop: "copperlark-signs", jobId: "j1" };
const draft = { version: 4, keptAt: "2026-03-04T10:00:00.000Z", document: emptyMockup({ quantity: 3 }) };
beforeEach(() => window.localStorage.clear());

describe("work kept in this browser", () => {
  it("is found again by the same person in the same job, until it is dropped", () => {
    expect(keepDraft(window.localStorage, place, draft)).toBe(true);
    expect(findDraft(window.localStorage, place)).toEqual(draft);
    expect(findDraft(window.localStorage, { ...place, personId: "p2" })).toBeNull();
    expect(findDraft(window.localStorage, { ...place, jobId: "j2" })).toBeNull();
    dropDraft(window.localStorage, place);
    expect(findDraft(window.localStorage, place)).toBeNull();
  });

  it.each(["not json", "{}", JSON.stringify({ ...draft, document: { version: 99 } })])(
    "is none when it reads %s",
    (text) => {
      keepDraft(window.localStorage, place, draft);
      window.localStorage.setItem(window.localStorage.key(0) ?? "", text);
      expect(findDraft(window.localStorage, place)).toBeNull();
    },
  );

  it("is said not to be kept when there is no room", () => {
    // jsdom gives each origin 5 million characters.
    window.localStorage.setItem("full", "x".repeat(4_999_900));
    expect(keepDraft(window.localStorage, place, draft)).toBe(false);
  });
});
