import { expect, it } from "vitest";
import { tracedFrom } from "../support/check-tracing.ts";
import { flatDrawings } from "../support/trace-agreement.ts";

// The same sets and measure as tests/reference/tracing.test.ts, sixty drawings of another seed.
const drawings = flatDrawings(20, 20_264);

it.each([
  { format: "png" as const, least: 0.988 },
  { format: "jpeg" as const, least: 0.99 },
])("sixty pictures in $format agree with the drawings that they were made from", async ({ format, least }) => {
  const { rows, mean } = await tracedFrom(drawings, format);
  expect(mean).toBeGreaterThan(least);
  const poor = rows.filter(({ worst }) => worst < 0.85).map(({ name, worst }) => `${name} ${worst.toFixed(3)}`);
  expect(poor.length, poor.join(", ")).toBeLessThanOrEqual(2);
  const miscounted = rows.filter(({ drawn, found }) => drawn !== found);
  expect(miscounted.length, miscounted.map(({ name }) => name).join(", ")).toBeLessThanOrEqual(6);
});
