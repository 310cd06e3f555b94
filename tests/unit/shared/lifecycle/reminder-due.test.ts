import { describe, expect, it } from "vitest";
import { clockIn, isTimeZone, reminderDue } from "#shared/lifecycle/reminder-due.ts";

const asked = { yesBy: "2031-05-16", issuedOn: "2031-05-06", hour: 9 };

describe("a reminder", () => {
  it.each([
    { today: "2031-05-13", due: null },
    { today: "2031-05-14", due: "before" },
    { today: "2031-05-16", due: "before" },
    { today: "2031-05-17", due: "after" },
    { today: "2031-05-19", due: "after" },
    { today: "2031-05-20", due: null },
  ])("on $today for the 16th: $due", ({ today, due }) => {
    expect(reminderDue({ ...asked, today })).toBe(due);
  });

  it.each([
    { hour: 8, due: null },
    { hour: 9, due: "before" },
    { hour: 17, due: "before" },
    { hour: 18, due: null },
  ])("at $hour o'clock: $due", ({ hour, due }) => {
    expect(reminderDue({ ...asked, today: "2031-05-14", hour })).toBe(due);
  });

  it.each([
    { issuedOn: "2031-05-14", today: "2031-05-15", due: null },
    { issuedOn: "2031-05-13", today: "2031-05-15", due: "before" },
    { issuedOn: "2031-05-16", today: "2031-05-17", due: "after" },
    { issuedOn: "2031-05-17", today: "2031-05-18", due: null },
  ])("of what went out on $issuedOn, on $today: $due", ({ issuedOn, today, due }) => {
    expect(reminderDue({ ...asked, issuedOn, today })).toBe(due);
  });
});

// Offsets as the IANA time zone database has them: New York is UTC-5 in winter and UTC-4 in summer, Auckland UTC+13 in January.
describe("a clock", () => {
  it.each([
    { zone: "UTC", at: "2031-01-10T00:30:00Z", day: "2031-01-10", hour: 0 },
    { zone: "America/New_York", at: "2031-01-10T00:30:00Z", day: "2031-01-09", hour: 19 },
    { zone: "America/New_York", at: "2031-07-10T13:00:00Z", day: "2031-07-10", hour: 9 },
    { zone: "Pacific/Auckland", at: "2031-01-10T20:00:00Z", day: "2031-01-11", hour: 9 },
  ])("in $zone at $at shows $day, $hour o'clock", ({ zone, at, day, hour }) => {
    expect(clockIn(zone, new Date(at))).toEqual({ day, hour });
  });

  it("is of a zone that exists", () => {
    expect(["UTC", "Europe/Vienna", "Nowhere/Land", ""].map(isTimeZone)).toEqual([true, true, false, false]);
  });
});
