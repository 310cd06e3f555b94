import { beforeAll, describe, expect, it } from "vitest";
import type { Figures } from "#shared/stack/figures.ts";
import { withCarried } from "@/features/mockup/model/carried.ts";
import { castShadows } from "@/features/mockup/model/cast-shadows.ts";
import { boxOfChosen } from "@/features/mockup/model/chosen-box.ts";
import { movePieces } from "@/features/mockup/model/commands/pieces.ts";
import { setBoard } from "@/features/mockup/model/commands/set-board.ts";
import { shiftsBetween } from "@/features/mockup/model/shifts.ts";
import { signWithFigures } from "../sign-with-figures.ts";

const { document, figuresOf } = signWithFigures();
let figures: Figures;
beforeAll(async () => {
  figures = await figuresOf(document);
});

describe("what stands on a piece", () => {
  it("goes along with it, and nothing goes along with what carries nothing", () => {
    expect(withCarried(figures, ["disc"])).toEqual(["disc", "ring", "sun"]);
    expect(withCarried(figures, ["ring"])).toEqual(["ring"]);
    expect(withCarried(figures, [])).toEqual([]);
  });
});

describe("a picture of a moment ago", () => {
  const moved = movePieces(document, { pieceIds: ["disc"], dx: 12, dy: -4 });

  it("is shifted by what was moved since, holes included, and by nothing else", () => {
    const shifts = shiftsBetween(document, moved);
    expect(shifts.get("disc")).toEqual({ dx: 12, dy: -4 });
    expect(shifts.get("disc-h-3")).toEqual({ dx: 12, dy: -4 });
    expect(shifts.size).toBe(5);
    expect(shiftsBetween(document, document).size).toBe(0);
  });

  it("gives the box of what is chosen where it is now", () => {
    const box = boxOfChosen(figures, ["disc"], shiftsBetween(document, moved));
    expect(box?.x).toBeCloseTo(300 - 137.5 + 12, 1);
    expect(box?.y).toBeCloseTo(200 - 137.5 - 4, 1);
  });
});

describe("a rough shadow in the hand", () => {
  it("falls away from the light as far as the piece stands over what is under it", () => {
    const lit = setBoard(document, { light: { azimuth: 270, elevation: 45, angularSize: 0.1 } });
    const shadows = castShadows(lit, figures);
    // Disc: 19 mm of barrel and 4.5 mm of sheet over the board, light at 45° from the left.
    expect(shadows.get("disc")?.dx).toBeCloseTo(23.5, 5);
    expect(shadows.get("disc")?.dy).toBeCloseTo(0, 5);
    expect(shadows.get("sun")?.dx).toBeCloseTo(3, 5);
  });
});
