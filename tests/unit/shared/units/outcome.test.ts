import { describe, expect, it } from "vitest";
import { checked, lengthRange, spanRange } from "#shared/units/outcome.ts";

const half = (length: number, range = lengthRange) => checked({ length: [length, range] }, () => length / 2);

describe("a checked calculation", () => {
  it("gives its value when the input lies in its range", () => {
    expect(half(10)).toEqual({ ok: true, value: 5 });
    expect(half(10_000)).toEqual({ ok: true, value: 5000 });
    expect(half(0, spanRange)).toEqual({ ok: true, value: 0 });
  });

  it.each([0, -0.001, 10_000.001, Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY])(
    "refuses a length of %d",
    (length) => {
      expect(half(length)).toEqual({ ok: false, reason: { field: "length", value: length, range: lengthRange } });
    },
  );

  it("names the first input that lies out of its range and does not compute", () => {
    const outcome = checked({ one: [1, lengthRange], two: [-2, spanRange], three: [Number.NaN, spanRange] }, () => {
      throw new Error("It was computed.");
    });
    expect(outcome).toMatchObject({ ok: false, reason: { field: "two", value: -2 } });
  });
});
