import { beforeEach, describe, expect, it } from "vitest";
import { findAids, keepAids } from "@/features/mockup/editor/kept-aids.ts";
import { usualAids } from "@/features/mockup/model/desk-aids.ts";

/** What somebody has who chose something. */
const aids = { ...usualAids("in"), grid: true, gridMm: 12.7, marginMm: null };

describe("rulers, grid and margin kept in the browser", () => {
  beforeEach(() => window.localStorage.clear());

  it("are each person's own", () => {
    expect(keepAids(window.localStorage, "ada", aids)).toBe(true);
    expect(findAids(window.localStorage, "ada")).toEqual(aids);
    expect(findAids(window.localStorage, "ben")).toBeNull();
  });

  it("are forgotten where they can't be read, and where nothing can be kept", () => {
    window.localStorage.setItem("standproud:desk-aids:ada", '{"rulers":true,"gridMm":-3}');
    expect(findAids(window.localStorage, "ada")).toBeNull();
    window.localStorage.setItem("standproud:desk-aids:ada", "{");
    expect(findAids(window.localStorage, "ada")).toBeNull();
    expect(keepAids(null, "ada", aids)).toBe(false);
    expect(findAids(null, "ada")).toBeNull();
  });

  it("begin with round lengths of the unit that one reads", () => {
    expect(usualAids("mm")).toMatchObject({ gridMm: 5, marginMm: 20 });
    // A quarter and three quarters of an inch of 25.4 mm.
    expect(usualAids("in").gridMm).toBeCloseTo(6.35, 9);
    expect(usualAids("in").marginMm).toBeCloseTo(19.05, 9);
  });
});
