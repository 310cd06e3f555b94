import { beforeAll, describe, expect, it } from "vitest";
import type { Figures } from "#shared/stack/figures.ts";
import { hideLayer } from "@/features/mockup/model/commands/show-layer.ts";
import { holeAt, pieceAt } from "@/features/mockup/model/piece-at.ts";
import { signWithFigures } from "../sign-with-figures.ts";

/** A disc of 275 mm on standoffs with a ring and a sun bonded on it, the ring 100 to 110 mm from the middle at 300, 200. */
const { document, figuresOf } = signWithFigures();
let figures: Figures;
beforeAll(async () => {
  figures = await figuresOf(document);
});

describe("what a finger touches", () => {
  it.each([
    { what: "the sun, which stands nearest the viewer", x: 305, y: 203, piece: "sun" },
    { what: "the disc, through the opening of the ring", x: 350, y: 200, piece: "disc" },
    { what: "the ring", x: 405, y: 200, piece: "ring" },
    { what: "the disc beyond the ring", x: 300, y: 320, piece: "disc" },
    { what: "nothing in the corner of the disc's box", x: 170, y: 70, piece: null },
  ])("is $what", ({ x, y, piece }) => {
    expect(pieceAt({ document, figures, reachMm: 0 }, { x, y })).toBe(piece);
  });

  it("is a piece just beside the finger when nothing lies under it", () => {
    const beside = { x: 300 + 137.5 + 3, y: 200 };
    expect(pieceAt({ document, figures, reachMm: 2 }, beside)).toBeNull();
    expect(pieceAt({ document, figures, reachMm: 4 }, beside)).toBe("disc");
  });

  it("is never a hidden piece", () => {
    const hidden = hideLayer(document, { key: "D", hidden: true });
    expect(pieceAt({ document: hidden, figures, reachMm: 0 }, { x: 305, y: 203 })).toBe("disc");
  });

  it("is a hole of the chosen layer anywhere under its cap, and no hole of another layer", () => {
    const hold = document.layers[0]?.hold;
    const hole = hold?.kind === "standoff" ? hold.holes[1] : undefined;
    if (!hole) throw new Error("The disc has no second hole.");
    expect(holeAt(document, "B", { x: hole.x + 7, y: hole.y })).toBe(hole.id);
    expect(holeAt(document, "B", { x: hole.x + 8, y: hole.y })).toBeNull();
    expect(holeAt(document, "C", hole)).toBeNull();
    expect(holeAt(document, null, hole)).toBeNull();
  });
});
