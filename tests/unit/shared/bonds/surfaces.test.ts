import { expect, it } from "vitest";
import { backSurface, woodSurface } from "#shared/bonds/surfaces.ts";

// Common practice: a mirror's coat is on its back, a frosted sheet is the same acrylic on both faces.
it.each([
  { look: "opaque", facesDiffer: false, surface: "acrylic" },
  { look: "opaque", facesDiffer: true, surface: "coated back" },
  { look: "clear", facesDiffer: true, surface: "coated back" },
  { look: "frosted", facesDiffer: true, surface: "acrylic" },
  { look: "mirror", facesDiffer: true, surface: "coated back" },
  { look: "mirror", facesDiffer: false, surface: "coated back" },
] as const)("a $look sheet, faces differ $facesDiffer, has $surface behind", ({ look, facesDiffer, surface }) => {
  expect(backSurface({ look, facesDiffer })).toBe(surface);
});

it("wood is raw until something is put on it", () => {
  expect(woodSurface([])).toBe("raw wood");
  expect(woodSurface([{ kind: "sanding", grit: 180 }])).toBe("raw wood");
  expect(
    woodSurface([
      { kind: "sanding", grit: 180 },
      { kind: "conditioner", name: "Sealer", dryingHours: 1 },
    ]),
  ).toBe("finished wood");
});
