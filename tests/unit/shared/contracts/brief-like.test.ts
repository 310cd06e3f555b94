import { describe, expect, it } from "vitest";
import { briefLike } from "#shared/contracts/brief-like.ts";
import type { Brief } from "#shared/contracts/jobs.ts";

const brief: Brief = {
  widthMm: 900,
  heightMm: 450,
  place: "outside",
  wall: "Red brick beside the slipway",
  viewingDistanceMm: 12_000,
  lighting: "Lamp over the Heron door",
  quantity: 4,
  brandColours: "Night blue",
  about: "Boats for hire",
  walkway: true,
  overhead: true,
  electrical: true,
  words: "HERON & WEIR",
};
const options = { words: ["Lobby sign", "HERON & WEIR"], newWords: "OTHER WORDS" };

describe("the brief of another sign like an earlier one", () => {
  it("has, for another client, the format and nothing that was said of the first", () => {
    expect(briefLike(brief, { ...options, sameClient: false })).toEqual({
      widthMm: 900,
      heightMm: 450,
      place: "outside",
      wall: "",
      viewingDistanceMm: 12_000,
      lighting: "",
      quantity: 4,
      brandColours: "",
      about: "",
      walkway: true,
      overhead: true,
      electrical: true,
      words: "OTHER WORDS",
    });
    const plain = { ...brief, lighting: "Spots from above" };
    expect(briefLike(plain, { ...options, sameClient: false }).lighting).toBe("Spots from above");
  });

  it("has, for the same client, what the client is, and not the old wall and words", () => {
    expect(briefLike(brief, { ...options, sameClient: true })).toEqual({ ...brief, wall: "", words: "OTHER WORDS" });
  });
});
