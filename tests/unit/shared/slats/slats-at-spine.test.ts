import { describe, expect, it } from "vitest";
import { slatsAtSpine } from "#shared/slats/slats-at-spine.ts";
import { usualSlats } from "../../../support/slat-boards.ts";

const board = { width: 600, height: 400 };

describe("the slats that a line beside the spine meets", () => {
  it("take their width over the sine of the angle each, from the height of the first one on", () => {
    // 30 mm at 30 degrees take 60 mm; the first begins 40 mm over the lower edge, so one of 40 lies under it.
    const design = { ...usualSlats, slatWidth: 30, angle: 30, start: { kind: "height", height: 40 } as const };
    const met = slatsAtSpine(board, design).map(({ strip, from, to }) => [strip, Math.round(from), Math.round(to)]);
    expect(met).toEqual([
      [5, 0, 60],
      [4, 60, 120],
      [3, 120, 180],
      [2, 180, 240],
      [1, 240, 300],
      [0, 300, 360],
      [-1, 360, 400],
    ]);
  });

  it("leave their gaps open, and are mirrored for slats that fall", () => {
    const design = {
      ...usualSlats,
      angle: 90,
      slatWidth: 90,
      gap: 10,
      direction: "down" as const,
      start: { kind: "height", height: 0 } as const,
    };
    expect(slatsAtSpine(board, design).map(({ from, to }) => [from, to])).toEqual([
      [0, 90],
      [100, 190],
      [200, 290],
      [300, 390],
    ]);
  });

  it("are none where slats can't be laid", () => {
    expect(slatsAtSpine(board, { ...usualSlats, slatWidth: 500 })).toEqual([]);
    expect(slatsAtSpine(board, { ...usualSlats, angle: Number.NaN })).toEqual([]);
  });
});
