import { describe, expect, it } from "vitest";
import { draftOf, type KeptDraft, newestFirst, recordOf } from "@/features/mockup/editor/draft-shelf.ts";
import version1 from "../../../../../fixtures/documents/version-1.json" with { type: "json" };
import { emptyMockup } from "../sample-mockup.ts";

const draft: KeptDraft = {
  deskId: "d1",
  version: 4,
  keptAt: "2026-03-04T10:00:00.000Z",
  changes: 3,
  lastChange: "Move pieces",
  document: emptyMockup({ quantity: 3 }),
};

describe("a draft on the shelf of a browser", () => {
  it("comes back as it was kept", () => {
    expect(draftOf(recordOf(draft))).toEqual(draft);
  });

  it("comes back in today's version of the document when an older page kept it", () => {
    expect(draftOf({ ...recordOf(draft), document: JSON.stringify(version1) })?.document.version).toBe(4);
  });

  it.each([
    { what: "no record", record: "text" },
    { what: "a record without its version", record: { ...recordOf(draft), version: undefined } },
    { what: "no JSON", record: { ...recordOf(draft), document: "{" } },
    { what: "a mockup of a later page", record: { ...recordOf(draft), document: '{"version":99}' } },
  ])("is none when it is $what", ({ record }) => {
    expect(draftOf(record)).toBeNull();
  });

  it("is listed with the newest first", () => {
    const older = { ...draft, deskId: "d2", keptAt: "2026-03-04T09:59:59.999Z" };
    expect(newestFirst([older, draft])).toEqual([draft, older]);
  });
});
