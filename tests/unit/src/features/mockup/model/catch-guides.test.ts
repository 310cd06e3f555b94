import { describe, expect, it } from "vitest";
import { catchGuides } from "@/features/mockup/model/catch-guides.ts";

const board = { x: 0, y: 0, width: 600, height: 400 };
const box = { x: 100, y: 50, width: 80, height: 40 };

describe("lining up", () => {
  it("catches the board's middle on both axes, and says where", () => {
    // Middle of the box at 140, 70: 160 and 130 short of the board's.
    expect(catchGuides({ box, dx: 158.5, dy: 131, reachMm: 2 }, [board])).toEqual({
      dx: 160,
      dy: 130,
      guides: [
        { axis: "x", at: 300 },
        { axis: "y", at: 200 },
      ],
    });
  });

  it("catches an edge with an edge, not with a middle", () => {
    const caught = catchGuides({ box, dx: 419, dy: 33, reachMm: 2 }, [board]);
    expect(caught).toEqual({ dx: 420, dy: 33, guides: [{ axis: "x", at: 600 }] });
  });

  it("takes the nearest of several lines", () => {
    const others = [
      { x: 203, y: 900, width: 10, height: 10 },
      { x: 201.5, y: 900, width: 10, height: 10 },
    ];
    expect(catchGuides({ box, dx: 101, dy: 0, reachMm: 3 }, others).dx).toBe(101.5);
  });

  it("leaves a move alone that comes near nothing", () => {
    expect(catchGuides({ box, dx: 33, dy: 44, reachMm: 2 }, [board])).toEqual({ dx: 33, dy: 44, guides: [] });
    expect(catchGuides({ box, dx: 160, dy: 130, reachMm: 2 }, [])).toEqual({ dx: 160, dy: 130, guides: [] });
  });
});
