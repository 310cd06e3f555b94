import { expect, it } from "vitest";
import { colourMatch, nearestStock } from "#shared/colour/nearest-stock.ts";

// Bands: common practice.
it.each([
  { deltaE: 0, match: "same" },
  { deltaE: 1, match: "same" },
  { deltaE: 1.001, match: "close" },
  { deltaE: 2, match: "close" },
  { deltaE: 2.001, match: "visible" },
  { deltaE: 5, match: "visible" },
  { deltaE: 5.001, match: "another colour" },
])("a difference of $deltaE is $match", ({ deltaE, match }) => {
  expect(colourMatch(deltaE)).toBe(match);
});

const stock = [
  { name: "Navy", colour: "#27314F" },
  { name: "Rust", colour: "#B4523B" },
  { name: "Navy again", colour: "#27314F" },
];

it("the nearest of the stock is found with its difference; of equals the first", () => {
  const exact = nearestStock("#27314f", stock);
  expect(exact).toMatchObject({ stock: { name: "Navy" }, deltaE: 0, match: "same" });
  const red = nearestStock("#C04030", stock);
  expect(red?.stock.name).toBe("Rust");
  expect(red?.deltaE).toBeGreaterThan(0);
});

it("without stock there is none", () => {
  expect(nearestStock("#27314F", [])).toBeNull();
});
