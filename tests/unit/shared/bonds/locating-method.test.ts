import { describe, expect, it } from "vitest";
import { locatingFit, proposedLocating } from "#shared/bonds/locating-method.ts";
import { locateSchema } from "#shared/mockup/document.ts";

const bonded = { hold: "bond", pieces: 3, holes: 0, opaque: true } as const;

// Common practice.
describe("a way of finding a piece's place", () => {
  it.each([
    { method: "pocket", layer: { ...bonded, hold: "pocket" }, finds: true },
    { method: "pocket", layer: bonded, finds: false },
    { method: "hole pattern", layer: { ...bonded, hold: "standoff", holes: 2 }, finds: true },
    { method: "hole pattern", layer: { ...bonded, hold: "standoff", holes: 1 }, finds: false },
    { method: "hole pattern", layer: bonded, finds: false },
    { method: "scored line", layer: bonded, finds: true },
    { method: "scored line", layer: { ...bonded, opaque: false }, finds: false },
    { method: "scored line", layer: { ...bonded, hold: "standoff" }, finds: false },
    { method: "template", layer: bonded, finds: true },
    { method: "none", layer: bonded, finds: false },
  ] as const)("$method on $layer: $finds", ({ method, layer, finds }) => {
    const fit = locatingFit(method, layer);
    expect(fit.finds).toBe(finds);
    expect(fit.why).toMatch(/\.$/);
  });

  it.each([
    { layer: bonded, method: "template" },
    { layer: { ...bonded, hold: "pocket" }, method: "pocket" },
    { layer: { ...bonded, hold: "standoff", holes: 4 }, method: "hole pattern" },
    { layer: { ...bonded, hold: "standoff", holes: 1 }, method: "template" },
  ] as const)("for $layer is best $method", ({ layer, method }) => {
    expect(proposedLocating(layer)).toBe(method);
  });

  it("that is proposed always finds it", () => {
    for (const hold of ["bond", "pocket", "standoff"] as const) {
      for (const opaque of [true, false]) {
        for (const holes of [0, 1, 2]) {
          const layer = { hold, pieces: 1, holes, opaque };
          expect(locatingFit(proposedLocating(layer), layer).finds).toBe(true);
        }
      }
    }
    expect(locateSchema.options).toHaveLength(5);
  });
});
