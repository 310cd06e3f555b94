import { expect, it } from "vitest";
import { checkReference } from "../support/check-reference.ts";
import { tracedFrom } from "../support/check-tracing.ts";
import { flatDrawings } from "../support/trace-agreement.ts";

// Source: drawings in flat colours of three open sets (Twemoji, Skill Icons, Circle Flags), drawn by resvg, which the tracing shares no code
// with. 1 would be a trace that is the drawing, pixel by pixel.
const drawings = flatDrawings(1, 77);

it.each([
  { format: "png" as const, least: 0.988 },
  { format: "jpeg" as const, least: 0.99 },
])("pictures in $format agree with the drawings that they were made from", async ({ format, least }) => {
  const { rows, mean } = await tracedFrom(drawings, format);
  checkReference({
    what: `Shared area of colours traced from ${format.toUpperCase()}`,
    source: "Twemoji, Skill Icons, Circle Flags by resvg",
    expected: 1,
    got: mean,
    within: 1 - least,
  });
  expect(Math.min(...rows.map(({ worst }) => worst))).toBeGreaterThan(0.85);
  for (const { name, drawn, found } of rows) expect(Math.abs(found - drawn), name).toBeLessThanOrEqual(1);
});
