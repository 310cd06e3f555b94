import { describe, expect, it } from "vitest";
import { counted, countInWords, daysUntil, formatBytes, formatDay, formatDue, formatInstant } from "@/lib/format.ts";

/** Local times, so that the test says the same in every time zone. */
const at = (text: string) => new Date(text);
const now = at("2026-11-30T09:30:00");

describe("formatInstant", () => {
  it.each([
    { past: "2026-11-30T07:05:00", text: "today 07:05" },
    { past: "2026-11-30T00:00:00", text: "today 00:00" },
    { past: "2026-11-29T23:59:00", text: "yesterday 23:59" },
    { past: "2026-11-27T16:09:00", text: "Fri 27 Nov 16:09" },
    { past: "2025-11-30T09:30:00", text: "30 Nov 2025" },
    { past: "2026-12-02T09:30:00", text: "2 Dec 2026" },
  ])("$past is $text", ({ past, text }) => {
    expect(formatInstant(at(past).toISOString(), now)).toBe(text);
  });
});

describe("formatDue", () => {
  it.each([
    { day: "2026-11-30", text: "due today", days: 0 },
    { day: "2026-12-01", text: "due tomorrow", days: 1 },
    { day: "2026-12-12", text: "due in 12 days", days: 12 },
    { day: "2026-11-29", text: "1 day late", days: -1 },
    { day: "2026-11-20", text: "10 days late", days: -10 },
  ])("$day is $text", ({ day, text, days }) => {
    expect(formatDue(day, now)).toBe(text);
    expect(daysUntil(day, now)).toBe(days);
  });

  it("counts calendar days late in the evening too", () => {
    expect(formatDue("2026-12-01", at("2026-11-30T23:59:00"))).toBe("due tomorrow");
  });
});

describe("short words", () => {
  it("writes a day", () => expect(formatDay("2026-11-03")).toBe("3 Nov 2026"));
  it.each([
    { bytes: 999, text: "999 bytes" },
    { bytes: 41_233, text: "41 kB" },
    { bytes: 2_340_000, text: "2.3 MB" },
  ])("$bytes bytes are $text", ({ bytes, text }) => expect(formatBytes(bytes)).toBe(text));
  it.each([
    { count: 0, text: "no jobs" },
    { count: 1, text: "1 job" },
    { count: 7, text: "7 jobs" },
  ])("counts $count", ({ count, text }) => expect(counted(count, "job")).toBe(text));
  it("counts in words up to twelve", () => {
    expect([0, 12, 13].map(countInWords)).toEqual(["no", "twelve", "13"]);
  });
});
