import { describe, expect, it } from "vitest";
import { inShopLane, laneLimits } from "#server/http/shop-lane.ts";

/** A change that is done when it is told to be. */
function change(shopId: string) {
  let end: (how: "done" | "failed") => void = () => undefined;
  let begun = false;
  const ended = new Promise<string>((resolve, reject) => {
    end = (how) => (how === "done" ? resolve(how) : reject(new Error(how)));
  });
  const outcome = inShopLane(shopId, () => {
    begun = true;
    return ended;
  }).catch((error: unknown) => error);
  return { outcome, hasBegun: () => begun, end: (how: "done" | "failed") => end(how) };
}

describe("a shop's lane", () => {
  it("runs four at once, the others in their order, and keeps no other shop waiting", async () => {
    const all = Array.from({ length: 6 }, () => change("a"));
    const other = change("b");
    expect(all.map(({ hasBegun }) => hasBegun())).toEqual([true, true, true, true, false, false]);
    expect(other.hasBegun()).toBe(true);
    // One that fails makes room as well.
    all[2]?.end("failed");
    expect(await all[2]?.outcome).toEqual(new Error("failed"));
    expect(all.map(({ hasBegun }) => hasBegun())).toEqual([true, true, true, true, true, false]);
    for (const { end } of [...all, other]) end("done");
    expect(await Promise.all([all[0], all[5], other].map((one) => one?.outcome))).toEqual(["done", "done", "done"]);
  });

  it("refuses in words when too many wait, and takes changes again after that", async () => {
    const all = Array.from({ length: laneLimits.atOnce + laneLimits.waiting }, () => change("c"));
    expect(await change("c").outcome).toMatchObject({ code: "too_many_requests" });
    for (const { end } of all) end("done");
    expect(new Set(await Promise.all(all.map(({ outcome }) => outcome)))).toEqual(new Set(["done"]));
    const after = change("c");
    after.end("done");
    expect(await after.outcome).toBe("done");
  });
});
