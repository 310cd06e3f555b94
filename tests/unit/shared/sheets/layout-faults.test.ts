import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Path } from "#shared/geometry/path.ts";
import { polygonRing, rectanglePath } from "#shared/geometry/shapes.ts";
import { cutShape, layShape } from "#shared/sheets/cut-shape.ts";
import type { LaidCopy } from "#shared/sheets/filler.ts";
import { layoutFaults } from "#shared/sheets/layout-faults.ts";
import { fieldsOfSheet, type SheetField } from "#shared/sheets/sheet-field.ts";
import { buildPiece, buildSheet } from "../../../support/concave-pieces.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const rules = { marginMm: 5, kerfMm: 3, spacingMm: 0, bed: null, leastOffcutMm: 100 };

function field(path: Path): SheetField {
  const region = path.map((ring) => [ring.start, ...ring.segments.map(({ to }) => to)]);
  const cut = fieldsOfSheet(buildSheet(1, 1, { path }), region, rules, kernel);
  const found = cut.ok ? cut.fields[0] : undefined;
  if (!found) throw new Error("The sheet has no field.");
  return found;
}

function square(index: number, x: number, y: number): LaidCopy {
  const path = rectanglePath({ x: 0, y: 0, width: 20, height: 20 });
  const region = [
    [
      { x: 0, y: 0 },
      { x: 20, y: 0 },
      { x: 20, y: 20 },
      { x: 0, y: 20 },
    ],
  ];
  const laid = layShape(cutShape(buildPiece(String(index), path), region, 1.5, kernel), 0, false);
  return { item: { index, shape: index, copy: 1 }, on: 0, laid, x, y };
}

const sheet = rectanglePath({ x: 0, y: 0, width: 100, height: 60 });
const wedge: Path = [
  polygonRing([
    { x: 0, y: 0 },
    { x: 100, y: 0 },
    { x: 0, y: 100 },
  ]),
];

describe("what must not stay where it lies", () => {
  it.each([
    {
      case: "three in a row, a kerf apart",
      path: sheet,
      at: [
        [5, 5],
        [28, 5],
        [51, 5],
      ],
      faulty: [],
    },
    {
      case: "the second nearer than a kerf",
      path: sheet,
      at: [
        [5, 5],
        [27.9, 5],
        [51, 5],
      ],
      faulty: [1],
    },
    {
      case: "two on one place",
      path: sheet,
      at: [
        [5, 5],
        [5, 5],
      ],
      faulty: [1],
    },
    // 2.1 and 2.1: their corners are 2.97 apart; 2.2 and 2.2 are 3.11.
    {
      case: "corners nearer than a kerf",
      path: sheet,
      at: [
        [5, 5],
        [27.1, 27.1],
      ],
      faulty: [1],
    },
    {
      case: "corners a kerf apart",
      path: sheet,
      at: [
        [5, 5],
        [27.2, 27.2],
      ],
      faulty: [],
    },
    {
      case: "over the margin",
      path: sheet,
      at: [
        [4.9, 5],
        [40, 5],
      ],
      faulty: [0],
    },
    {
      case: "over the far margin",
      path: sheet,
      at: [
        [5, 5],
        [75, 35.1],
      ],
      faulty: [1],
    },
    {
      case: "within the box of a wedge, but over its slanting edge",
      path: wedge,
      at: [
        [5, 5],
        [60, 40],
      ],
      faulty: [1],
    },
    // The corner at (x + 20, y + 20) of (26, 26) lies 5.66 off the edge, of (27, 27) 4.24.
    { case: "in a wedge, a margin off", path: wedge, at: [[26, 26]], faulty: [] },
    { case: "in a wedge, less than a margin off", path: wedge, at: [[27, 27]], faulty: [0] },
  ] as const)("$case: $faulty", ({ path, at, faulty }) => {
    const copies = at.map(([x, y], index) => square(index, x, y));
    const found = layoutFaults(copies, field(path), { marginMm: 5, gapMm: 3 }, kernel);
    expect([...found].map(({ item }) => item.index)).toEqual(faulty);
  });
});
