import { describe, expect, it } from "vitest";
import type { Mockup } from "#shared/contracts/mockups.ts";
import {
  type Autosave,
  type AutosaveEvent,
  hasUnsavedWork,
  nextAutosave,
  saveDueAt,
  startAutosave,
} from "@/features/mockup/model/autosave.ts";
import { emptyMockup } from "../sample-mockup.ts";

const newer: Mockup = {
  version: 9,
  document: emptyMockup({ quantity: 3 }),
  savedAt: "2026-03-04T10:00:00.000Z",
  savedBy: "Robin",
  can: { edit: true, issue: true },
};
const start = startAutosave({ version: 4, savedAt: null });
const stateAfter = (...events: AutosaveEvent[]): Autosave => events.reduce(nextAutosave, start);
const edited = (now: number): AutosaveEvent => ({ kind: "edited", now });
const answered: AutosaveEvent = { kind: "answered", version: 5, savedAt: "2026-03-04T09:41:00.000Z" };

describe("autosave", () => {
  it("saves when edits pause, and after two seconds at most when they don't", () => {
    expect(saveDueAt(start)).toBeNull();
    expect(saveDueAt(stateAfter(edited(1000)))).toBe(1800);
    expect(saveDueAt(stateAfter(edited(1000), edited(1700)))).toBe(2500);
    expect(saveDueAt(stateAfter(edited(1000), edited(1700), edited(2400), edited(2900)))).toBe(3000);
  });

  it("is saved once the answer is there, at the version it says", () => {
    expect(stateAfter(edited(0), { kind: "sent" }, answered)).toEqual({
      state: "saved",
      version: 5,
      savedAt: "2026-03-04T09:41:00.000Z",
    });
  });

  it("is not saved when the work went on under way", () => {
    const autosave = stateAfter(edited(0), { kind: "sent" }, edited(500), edited(600), answered);
    expect(autosave).toMatchObject({ state: "dirty", version: 5, since: 500 });
    expect(hasUnsavedWork(autosave)).toBe(true);
  });

  it("waits for a choice when someone saved a newer version, and keeps edits made meanwhile from being sent", () => {
    const stale = stateAfter(edited(0), { kind: "sent" }, { kind: "newer", newer }, edited(900), { kind: "sent" });
    expect(stale).toMatchObject({ state: "stale", version: 4 });
    expect(saveDueAt(stale)).toBeNull();
    const mine = nextAutosave(stale, { kind: "keep mine", now: 5000 });
    expect(mine).toMatchObject({ state: "dirty", version: 9 });
    expect(saveDueAt(mine)).toBeLessThanOrEqual(5000);
    expect(nextAutosave(stale, { kind: "keep theirs" })).toEqual({
      state: "saved",
      version: 9,
      savedAt: newer.savedAt,
    });
  });

  it("tries again after five seconds when the server can't be reached", () => {
    const offline = stateAfter(edited(0), { kind: "sent" }, { kind: "unreachable", now: 2000 }, edited(2500));
    expect(offline.state).toBe("offline");
    expect(saveDueAt(offline)).toBe(7000);
    expect(nextAutosave(nextAutosave(offline, { kind: "sent" }), answered).state).toBe("saved");
  });

  it("says why a save was refused, and tries again with the next edit only", () => {
    const refused = stateAfter(edited(0), { kind: "sent" }, { kind: "refused", why: "You may look, but not do this." });
    expect(refused).toMatchObject({ state: "refused", why: "You may look, but not do this." });
    expect(saveDueAt(refused)).toBeNull();
    expect(nextAutosave(refused, edited(10)).state).toBe("dirty");
  });

  it("takes no notice of answers that nobody waits for", () => {
    expect(stateAfter(answered)).toBe(start);
    expect(stateAfter({ kind: "newer", newer })).toBe(start);
    expect(stateAfter({ kind: "keep theirs" })).toBe(start);
  });
});
