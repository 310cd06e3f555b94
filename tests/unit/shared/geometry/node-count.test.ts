import { expect, it } from "vitest";
import { nodeCount } from "#shared/geometry/node-count.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";

it("counts each node once, whether a ring returns by itself or not", () => {
  const square = rectanglePath({ x: 0, y: 0, width: 10, height: 10 });
  const circle = circlePath({ x: 5, y: 5 }, 3);
  expect(nodeCount(square)).toBe(4);
  expect(nodeCount(circle)).toBe(4);
  expect(nodeCount([...square, ...circle])).toBe(8);
  const returning = square.map(({ start, segments }) => ({
    start,
    segments: [...segments, { kind: "line" as const, to: start }],
  }));
  expect(nodeCount(returning)).toBe(4);
  expect(nodeCount([])).toBe(0);
});
