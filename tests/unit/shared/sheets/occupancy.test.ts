import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Region } from "#shared/geometry/path.ts";
import { circlePath } from "#shared/geometry/shapes.ts";
import { type CellMask, cellMask } from "#shared/sheets/cell-mask.ts";
import { emptyOccupancy, findPlace, stamp } from "#shared/sheets/occupancy.ts";

const polygon = (...points: readonly (readonly [number, number])[]): Region => [points.map(([x, y]) => ({ x, y }))];
const cell = { along: "x", u: 1, v: 1 } as const;
const origin = { x: 0, y: 0 };

/** The touched cells as rows of text, u to the right and v down. */
function drawn(mask: CellMask): string[] {
  const rows = Array.from({ length: mask.rows }, () => Array.from({ length: mask.columns }, () => "."));
  for (const [run, column] of mask.runColumns.entries())
    for (let row = mask.runStarts[run] ?? 0; row < (mask.runEnds[run] ?? 0); row++)
      rows[row]?.fill("#", column, column + 1);
  return rows.map((row) => row.join(""));
}

describe("cells that a shape touches", () => {
  it("a square on the grid touches its own cells and none beside them", () => {
    expect(drawn(cellMask(polygon([0, 0], [3, 0], [3, 2], [0, 2]), origin, cell))).toEqual(["###", "###"]);
  });

  it("a hair over the grid's lines it touches the next ones too", () => {
    expect(drawn(cellMask(polygon([0, 0], [3.001, 0], [3.001, 2], [0, 2]), origin, cell))).toEqual(["####", "####"]);
  });

  it("a triangle touches every cell that its slanting edge runs through", () => {
    expect(drawn(cellMask(polygon([0, 0], [4, 0], [0, 4]), origin, cell))).toEqual(["####", "###.", "##..", "#..."]);
  });

  it("an opening is left free as far as whole cells of it are", () => {
    const frame: Region = [...polygon([0, 0], [5, 0], [5, 5], [0, 5]), ...polygon([1, 1], [4, 1], [4, 3.5], [1, 3.5])];
    expect(drawn(cellMask(frame, origin, cell))).toEqual(["#####", "#...#", "#...#", "#####", "#####"]);
  });

  it("filled along y, columns and rows change places", () => {
    const mask = cellMask(polygon([0, 0], [3, 0], [3, 2], [0, 2]), origin, { ...cell, along: "y" });
    expect([mask.columns, mask.rows]).toEqual([2, 3]);
  });

  it("every point of a disc lies in a touched cell, whatever the cells", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.3, max: 3, noNaN: true }),
        fc.double({ min: 2, max: 9, noNaN: true }),
        (size, radius) => {
          const disc = flattenPath(circlePath({ x: 10, y: 10 }, radius));
          const rows = drawn(cellMask(disc, { x: 0.5, y: 0.5 }, { along: "x", u: size, v: size * 0.8 }));
          for (let step = 0; step < 200; step++) {
            const point = {
              x: 10 + radius * Math.cos(step) * ((step % 10) / 9),
              y: 10 + radius * Math.sin(step) * ((step % 10) / 9),
            };
            if (!regionContains(disc, point)) continue;
            const [column, row] = [Math.floor((point.x - 0.5) / size), Math.floor((point.y - 0.5) / (size * 0.8))];
            expect(rows[row]?.[column], `${point.x}, ${point.y}`).toBe("#");
          }
        },
      ),
      { numRuns: 50 },
    );
  });
});

const boxMask = (width: number, height: number): CellMask =>
  cellMask(polygon([0, 0], [width, 0], [width, height], [0, height]), origin, cell);
const ellMask = (size: number): CellMask =>
  cellMask(polygon([0, 0], [size, 0], [size, 1], [1, 1], [1, size], [0, size]), origin, cell);

describe("the first free place", () => {
  it("is found column by column, past what is taken", () => {
    const grid = emptyOccupancy(6, 5);
    stamp(grid, boxMask(2, 4), 0, 0, 1);
    const meter = { probes: 0 };
    expect(findPlace(grid, boxMask(2, 1), 0, 9, meter)).toEqual({ column: 0, row: 4 });
    expect(findPlace(grid, boxMask(2, 2), 0, 9, meter)).toEqual({ column: 2, row: 0 });
    expect(findPlace(grid, boxMask(5, 2), 0, 9, meter)).toBeNull();
    expect(findPlace(grid, boxMask(2, 2), 0, 1, meter)).toBeNull();
    expect(meter.probes).toBeGreaterThan(0);
  });

  it("is what trying every cell finds, however shapes come and go", () => {
    const placing = fc.record({ size: fc.integer({ min: 1, max: 5 }), isEll: fc.boolean(), drops: fc.nat(20) });
    fc.assert(
      fc.property(fc.array(placing, { maxLength: 25 }), (steps) => {
        const grid = emptyOccupancy(9, 11);
        const laid: { mask: CellMask; column: number; row: number }[] = [];
        for (const { size, isEll, drops } of steps) {
          const mask = isEll ? ellMask(size) : boxMask(size, 6 - size);
          const found = findPlace(grid, mask, 0, 9, { probes: 0 });
          expect(found).toEqual(firstByTrying(grid.taken, mask));
          if (found) {
            stamp(grid, mask, found.column, found.row, 1);
            laid.push({ mask, ...found });
          }
          const gone = drops < laid.length ? laid.splice(drops, 1)[0] : undefined;
          if (gone) stamp(grid, gone.mask, gone.column, gone.row, 0);
        }
      }),
      { numRuns: 300 },
    );
  });
});

function firstByTrying(taken: Uint8Array, mask: CellMask): { column: number; row: number } | null {
  for (let column = 0; column + mask.columns <= 9; column++) {
    for (let row = 0; row + mask.rows <= 11; row++) {
      let isFree = true;
      for (const [run, at] of mask.runColumns.entries())
        for (let cellRow = mask.runStarts[run] ?? 0; cellRow < (mask.runEnds[run] ?? 0); cellRow++)
          isFree &&= taken[(column + at) * 11 + row + cellRow] === 0;
      if (isFree) return { column, row };
    }
  }
  return null;
}
