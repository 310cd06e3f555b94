import { describe, expect, it } from "vitest";
import { addDays, needsYesBy } from "#shared/lifecycle/needs-yes-by.ts";

const none = { buildDays: 0, dryingHours: 0, freightDays: 0 };

// Worked out by hand on a calendar: 2031-05-06 is a Tuesday (no source).
describe("the day a yes is needed by", () => {
  it.each([
    { lead: {}, day: "2031-05-06" },
    { lead: { freightDays: 2 }, day: "2031-05-04" },
    { lead: { dryingHours: 24 }, day: "2031-05-05" },
    { lead: { dryingHours: 25 }, day: "2031-05-04" },
    { lead: { buildDays: 1 }, day: "2031-05-05" },
    { lead: { buildDays: 2 }, day: "2031-05-04" },
    { lead: { buildDays: 7 }, day: "2031-04-27" },
    { lead: { buildDays: 5, dryingHours: 72, freightDays: 2 }, day: "2031-04-24" },
    { lead: { buildDays: 1, freightDays: 2 }, day: "2031-05-01" },
  ])("with $lead before Tuesday the 6th is $day", ({ lead, day }) => {
    expect(needsYesBy("2031-05-06", { ...none, ...lead })).toBe(day);
  });

  it("counts over the end of February in a leap year and over a year's end", () => {
    expect(addDays("2028-03-01", -1)).toBe("2028-02-29");
    expect(needsYesBy("2031-01-01", { ...none, buildDays: 1 })).toBe("2030-12-31");
  });
});
