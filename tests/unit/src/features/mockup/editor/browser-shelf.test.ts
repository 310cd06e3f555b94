import { expect, it } from "vitest";
import { browserShelf } from "@/features/mockup/editor/browser-shelf.ts";
import { emptyMockup } from "../sample-mockup.ts";

// Nothing here has IndexedDB, as a browser that lets pages keep nothing; the browser tests have it.
it("says that nothing may be kept, and offers nothing, where a browser has no store for pages", async () => {
  const shelf = browserShelf();
  const place = { personId: "p1", shop: "copperlark-signs", jobId: "j1" };
  const draft = {
    deskId: "d1",
    version: 1,
    keptAt: "2026-03-04T10:00:00.000Z",
    changes: 1,
    lastChange: null,
    document: emptyMockup(),
  };
  expect("indexedDB" in globalThis).toBe(false);
  expect(await shelf.put(place, draft)).toBe("forbidden");
  expect(await shelf.list(place)).toEqual([]);
  await expect(shelf.remove(place, "d1")).resolves.toBeUndefined();
});
