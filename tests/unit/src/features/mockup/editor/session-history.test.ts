import { expect, it } from "vitest";
import { leaveHistory, resumeHistory } from "@/features/mockup/editor/session-history.ts";
import { commit, startHistory } from "@/features/mockup/model/history.ts";
import { emptyMockup } from "../sample-mockup.ts";

const place = { personId: "p1", shop: "copperlark-signs", jobId: "j1" };

it("takes up the steps of a mockup that was left as it is now, and of no other", () => {
  const left = commit(startHistory(emptyMockup()), emptyMockup({ quantity: 2 }), { label: "Board" });
  leaveHistory(place, left);
  // The document comes from the server anew, the same in all that it holds.
  expect(resumeHistory(place, emptyMockup({ quantity: 2 }))).toBe(left);
  const changed = emptyMockup({ quantity: 3 });
  expect(resumeHistory(place, changed)).toEqual(startHistory(changed));
  expect(resumeHistory({ ...place, jobId: "j2" }, emptyMockup({ quantity: 2 })).past).toEqual([]);
  expect(resumeHistory({ ...place, personId: "p2" }, emptyMockup({ quantity: 2 })).past).toEqual([]);
});
