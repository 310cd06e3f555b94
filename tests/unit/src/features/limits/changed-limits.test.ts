import { expect, it } from "vitest";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { changedLimits, onto } from "@/features/limits/model/changed-limits.ts";

it("a limit is changed when it is written otherwise, emptied or spoilt", () => {
  expect(changedLimits(defaultLimits, defaultLimits)).toEqual([]);
  const written = { ...defaultLimits, coverMm: null, reachMm: Number.NaN, bedWidthMm: 901 };
  expect(changedLimits(written, defaultLimits)).toEqual(["reachMm", "coverMm", "bedWidthMm"]);
});

it("one's own changes go over what somebody else saved, and nothing else does", () => {
  const newer = { ...defaultLimits, coverMm: 2, bedWidthMm: 1220 };
  const written = { ...defaultLimits, bedWidthMm: 1300, reachMm: null };
  expect(onto(newer, written, defaultLimits)).toEqual({
    ...defaultLimits,
    coverMm: 2,
    bedWidthMm: 1300,
    reachMm: null,
  });
});
