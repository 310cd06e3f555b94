import { describe, expect, it } from "vitest";
import { lineUpShift } from "#shared/setting-out/line-up.ts";

describe("lining one box up with another", () => {
  const box = { x: 10, y: 20, width: 30, height: 8 };
  const other = { x: 100, y: 50, width: 70, height: 44 };
  it.each([
    { by: "left", shift: { dx: 90, dy: 0 } },
    { by: "centre", shift: { dx: 110, dy: 0 } },
    { by: "right", shift: { dx: 130, dy: 0 } },
    { by: "top", shift: { dx: 0, dy: 30 } },
    { by: "middle", shift: { dx: 0, dy: 48 } },
    { by: "bottom", shift: { dx: 0, dy: 66 } },
  ] as const)("by its $by it goes $shift", ({ by, shift }) => {
    expect(lineUpShift(box, other, by)).toEqual(shift);
  });
});
