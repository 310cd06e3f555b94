import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { draftKeeper } from "@/features/mockup/editor/draft-keeper.ts";
import { emptyMockup } from "../sample-mockup.ts";
import { memoryShelf } from "./memory-shelf.ts";

const place = { personId: "p1", shop: "copperlark-signs", jobId: "j1" };
const work = (quantity: number) => ({
  version: 4,
  changes: quantity,
  lastChange: "Board",
  document: emptyMockup({ quantity }),
});

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

function keeperOn(shelf = memoryShelf(), deskId = "d1") {
  const outcomes: string[] = [];
  const keeper = draftKeeper({ shelf, place, deskId, onOutcome: (outcome) => outcomes.push(outcome) });
  const kept = async () => (await shelf.list(place)).map(({ document }) => document.quantity);
  return { shelf, keeper, outcomes, kept };
}

describe("the keeper of one desk's work", () => {
  it("keeps the last of several changes once hands rest, with when and what", async () => {
    const { shelf, keeper, kept, outcomes } = keeperOn();
    keeper.keepSoon(work(1));
    await vi.advanceTimersByTimeAsync(200);
    keeper.keepSoon(work(2));
    await vi.advanceTimersByTimeAsync(299);
    expect(await kept()).toEqual([]);
    await vi.advanceTimersByTimeAsync(2);
    expect(await kept()).toEqual([2]);
    expect(await shelf.list(place)).toMatchObject([{ deskId: "d1", version: 4, changes: 2, lastChange: "Board" }]);
    expect(outcomes).toEqual(["kept"]);
  });

  it("keeps within two seconds also while hands never rest", async () => {
    const { keeper, kept } = keeperOn();
    for (let tap = 1; tap <= 20; tap += 1) {
      keeper.keepSoon(work(tap));
      await vi.advanceTimersByTimeAsync(100);
    }
    expect((await kept())[0]).toBeGreaterThanOrEqual(10);
  });

  it("lets go of what the server has, and of what was about to be kept", async () => {
    const { keeper, kept } = keeperOn();
    await keeper.keepNow(work(1));
    expect(await kept()).toEqual([1]);
    keeper.keepSoon(work(2));
    await keeper.letGo();
    await vi.advanceTimersByTimeAsync(5000);
    expect(await kept()).toEqual([]);
  });

  it("leaves another desk's work alone", async () => {
    const shelf = memoryShelf();
    const mine = keeperOn(shelf, "d1");
    const other = keeperOn(shelf, "d2");
    await mine.keeper.keepNow(work(1));
    await vi.advanceTimersByTimeAsync(5);
    await other.keeper.keepNow(work(2));
    expect(await mine.kept()).toEqual([2, 1]);
    await other.keeper.letGo();
    expect(await mine.kept()).toEqual([1]);
  });

  it("says when there is no room, and when there is again", async () => {
    const { shelf, keeper, outcomes } = keeperOn();
    shelf.outcome = "full";
    await keeper.keepNow(work(1));
    shelf.outcome = "kept";
    await keeper.keepNow(work(2));
    expect(outcomes).toEqual(["full", "kept"]);
  });
});
