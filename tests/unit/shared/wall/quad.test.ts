import { describe, expect, it } from "vitest";
import { cornerAt, cornerFault, type Quad } from "#shared/wall/quad.ts";

const quad = (...places: readonly [number, number][]): Quad => {
  const [a, b, c, d] = places.map(([x, y]) => ({ x, y }));
  if (!a || !b || !c || !d) throw new Error("Four corners.");
  return [a, b, c, d];
};

describe("marked corners", () => {
  it.each([
    { name: "of a sheet seen aslant", corners: quad([100, 90], [300, 120], [290, 400], [110, 420]), fault: null },
    {
      name: "of a sheet rolled by half a turn",
      corners: quad([290, 400], [110, 420], [100, 90], [300, 120]),
      fault: null,
    },
    {
      name: "of which two changed places",
      corners: quad([300, 120], [100, 90], [290, 400], [110, 420]),
      fault: "crossed",
    },
    {
      name: "of which one lies within the others",
      corners: quad([100, 90], [300, 120], [150, 150], [110, 420]),
      fault: "crossed",
    },
    {
      name: "that run the wrong way round",
      corners: quad([300, 120], [100, 90], [110, 420], [290, 400]),
      fault: "mirrored",
    },
    { name: "in a line", corners: quad([100, 100], [200, 100], [300, 100], [110, 420]), fault: "in a line" },
    { name: "at one place", corners: quad([100, 100], [100, 100], [300, 300], [100, 300]), fault: "in a line" },
    { name: "of a sheet of 39 px", corners: quad([100, 100], [139, 100], [139, 160], [100, 160]), fault: "too small" },
    { name: "of a sheet of 40 px", corners: quad([100, 100], [140, 100], [140, 160], [100, 160]), fault: null },
    {
      name: "that are no numbers",
      corners: quad([Number.NaN, 100], [140, 100], [140, 160], [100, 160]),
      fault: "crossed",
    },
  ])("$name: $fault", ({ corners, fault }) => {
    expect(cornerFault(corners)).toBe(fault);
  });

  it("are counted round", () => {
    const corners = quad([1, 2], [3, 4], [5, 6], [7, 8]);
    expect(cornerAt(corners, 5)).toEqual({ x: 3, y: 4 });
    expect(cornerAt(corners, -1)).toEqual({ x: 7, y: 8 });
  });
});
