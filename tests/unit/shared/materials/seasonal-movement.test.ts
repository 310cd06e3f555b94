import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { movementAcross, seasonalMovementMm } from "#shared/materials/seasonal-movement.ts";
import { woodMovementOf, woodMovements } from "#shared/materials/wood-movement.ts";
import { resultOf } from "../../../support/reference-data.ts";

const board = { dimension: 100, perPoint: 0.002, from: 8, to: 11, grainAngle: 90 };

describe("wood that moves with the seasons", () => {
  it("moves across the grain and not along it", () => {
    expect(resultOf(seasonalMovementMm(board))).toBeCloseTo(0.6, 9);
    expect(resultOf(seasonalMovementMm({ ...board, grainAngle: 0 }))).toBe(0);
    expect(resultOf(seasonalMovementMm({ ...board, grainAngle: 45 }))).toBeCloseTo(0.3, 9);
  });

  it.each([
    { change: { from: 5.9 }, field: "from" },
    { change: { to: 14.1 }, field: "to" },
    { change: { dimension: -1 }, field: "dimension" },
    { change: { perPoint: Number.NaN }, field: "perPoint" },
    { change: { grainAngle: Number.POSITIVE_INFINITY }, field: "grainAngle" },
  ])("is refused for $field of $change", ({ change, field }) => {
    expect(seasonalMovementMm({ ...board, ...change })).toMatchObject({ ok: false, reason: { field } });
  });

  it("comes back to what it was, and two parts move as much as the whole", () => {
    const moisture = fc.double({ min: 6, max: 14, noNaN: true });
    const mm = fc.double({ min: 0, max: 5000, noNaN: true });
    fc.assert(
      fc.property(
        mm,
        mm,
        moisture,
        moisture,
        fc.double({ min: -180, max: 180, noNaN: true }),
        (a, b, from, to, grainAngle) => {
          const move = (dimension: number, start: number, end: number) =>
            resultOf(seasonalMovementMm({ dimension, perPoint: 0.00212, from: start, to: end, grainAngle }));
          expect(move(a, from, to) + move(a, to, from)).toBeCloseTo(0, 9);
          expect(move(a, from, to) + move(b, from, to)).toBeCloseTo(move(a + b, from, to), 6);
        },
      ),
    );
  });

  it("moves by its tangential coefficient unless it is quartersawn", () => {
    const pine = { species: "pine", radial: 0.00071, tangential: 0.00212 };
    expect(movementAcross(pine, "flatsawn")).toBe(0.00212);
    expect(movementAcross(pine, "unknown")).toBe(0.00212);
    expect(movementAcross(pine, "quartersawn")).toBe(0.00071);
  });

  it("moves more along the rings than across them in every species", () => {
    for (const { radial, tangential } of woodMovements) expect(tangential).toBeGreaterThan(radial);
    expect(woodMovementOf("cardboard")).toBeNull();
  });
});
