import { describe, expect, it } from "vitest";
import { fitSign, marginsOf, paperScaleAt, usualMargins, viewAt } from "@/features/mockup/canvas/view-of-board.ts";

describe("the view of a board", () => {
  it.each([
    { board: { width: 600, height: 400 }, room: { width: 1130, height: 540 } },
    { board: { width: 150, height: 900 }, room: { width: 1130, height: 540 } },
    { board: { width: 5000, height: 300 }, room: { width: 700, height: 420 } },
  ])("$board.width by $board.height lies with its dimensions inside $room.width by $room.height", ({ board, room }) => {
    const fit = fitSign({ x: 0, y: 0, ...board }, usualMargins, room);
    const paperMm = 13 / 3.4;
    expect(fit.x - usualMargins.left * paperMm).toBeGreaterThanOrEqual(0);
    expect(fit.y - usualMargins.top * paperMm).toBeGreaterThanOrEqual(0);
    expect(fit.x + board.width * fit.scale + usualMargins.right * paperMm).toBeLessThanOrEqual(room.width);
    expect(fit.y + board.height * fit.scale + usualMargins.bottom * paperMm).toBeLessThanOrEqual(room.height);
  });

  it("keeps a frame round the board inside too", () => {
    const room = { width: 700, height: 900 };
    const fit = fitSign({ x: -20, y: -20, width: 640, height: 440 }, usualMargins, room);
    const paperMm = 13 / 3.4;
    const [left, right] = [fit.x - 20 * fit.scale, fit.x + 620 * fit.scale];
    expect(left - usualMargins.left * paperMm).toBeCloseTo(10, 6);
    expect(right + usualMargins.right * paperMm).toBeCloseTo(690, 6);
  });

  it("letters at 13 px: an em of 3.4 mm of paper at the scale shown", () => {
    const { scale } = fitSign({ x: 0, y: 0, width: 600, height: 400 }, usualMargins, { width: 1130, height: 540 });
    expect(3.4 * paperScaleAt(scale) * scale).toBeCloseTo(13, 1);
  });

  it("has a spot in its middle, three times as close", () => {
    const room = { width: 1000, height: 500 };
    const fit = { scale: 0.8, x: 40, y: 60 };
    const view = viewAt({ x: 100, y: 300 }, fit, room);
    expect(view.scale).toBeCloseTo(2.4, 9);
    expect(view.x + 100 * view.scale).toBeCloseTo(500, 9);
    expect(view.y + 300 * view.scale).toBeCloseTo(250, 9);
  });

  it("leaves room above for every row of dimensions that the section has beyond two, 8 mm of paper each", () => {
    const plane = { kind: "group" as const, id: "board-plane", x: 70, y: 70, scale: 1, items: [] };
    const list = { widthMm: 800, heightMm: 620, items: [plane] };
    const topWith = (sectionRows: number) =>
      marginsOf(list, { x: 0, y: 0, width: 600, height: 400 }, { paperScale: 5, sectionRows }).top;
    expect([0, 1, 2].map(topWith)).toEqual([14, 14, 14]);
    expect([3, 5].map(topWith)).toEqual([14 + 8, 14 + 3 * 8]);
  });
});
