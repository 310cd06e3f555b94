import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import type { SheetKind } from "#shared/sheets/choose-sheets.ts";
import { cutShape } from "#shared/sheets/cut-shape.ts";
import { exchangeLast } from "#shared/sheets/exchange-last.ts";
import type { FillControl, OpenField } from "#shared/sheets/filler.ts";
import type { StockSheet } from "#shared/sheets/nesting.ts";
import { rectangleFiller } from "#shared/sheets/rectangle-filler.ts";
import { fieldsOfSheet } from "#shared/sheets/sheet-field.ts";
import { buildPiece, buildSheet } from "../../../support/concave-pieces.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const rules = { marginMm: 0, kerfMm: 0, spacingMm: 0, bed: null, leastOffcutMm: 100 };
const control: FillControl = { probes: 0, seed: 1, shouldStop: () => false, onProgress: () => undefined };

function kindOf(stock: StockSheet): SheetKind {
  const cut = fieldsOfSheet(stock, flattenPath(stock.path), rules, kernel);
  if (!cut.ok) throw new Error(cut.remark);
  return { stock, fields: cut.fields };
}

/** Squares of 100, laid on sheets that are opened in that order; where they lie after the exchange. */
function exchanged(copies: number, stock: readonly StockSheet[], opened: readonly string[]): string[] {
  const path = rectanglePath({ x: 0, y: 0, width: 100, height: 100 });
  const shapes = [cutShape(buildPiece("square", path), flattenPath(path), 0, kernel)];
  const filler = rectangleFiller(shapes, 0);
  const kinds = stock.map(kindOf);
  const open = opened.flatMap((id, index): OpenField[] => {
    const sheet = opened.slice(0, index + 1).filter((each) => each === id).length;
    return (kinds.find((kind) => kind.stock.id === id)?.fields ?? []).map((field) => ({ field, sheet }));
  });
  const items = Array.from({ length: copies }, (_, index) => ({ index, shape: 0, copy: index + 1 }));
  const filling = filler.fill(items, open, control);
  const found = exchangeLast({ open, filling }, kinds, filler, control);
  expect(found.filling.laid).toHaveLength(copies);
  return [...new Set(found.filling.laid.map(({ on }) => `${found.open[on]?.field.stock.id} ${found.open[on]?.sheet}`))];
}

describe("the last sheet is exchanged for a cheaper one", () => {
  const large = buildSheet(400, 300, { id: "large" });
  const small = buildSheet(300, 200, { id: "small" });
  const one = { ...small, quantity: 1 };
  const offcut = buildSheet(350, 250, { id: "offcut", isOffcut: true, quantity: 1 });

  it.each([
    {
      case: "where its pieces fit on it",
      copies: 14,
      stock: [large, small],
      opened: ["large", "large"],
      lie: ["large 1", "small 1"],
    },
    {
      case: "not where they do not",
      copies: 19,
      stock: [large, small],
      opened: ["large", "large"],
      lie: ["large 1", "large 2"],
    },
    {
      case: "the cheapest first: an offcut counts half",
      copies: 14,
      stock: [large, small, offcut],
      opened: ["large", "large"],
      lie: ["large 1", "offcut 1"],
    },
    {
      case: "not for one that is used already",
      copies: 8,
      stock: [large, one],
      opened: ["small", "large"],
      lie: ["small 1", "large 1"],
    },
    { case: "never for a dearer one", copies: 2, stock: [large, small], opened: ["small"], lie: ["small 1"] },
    {
      case: "a sheet that nothing lies on is forgotten",
      copies: 3,
      stock: [large, small],
      opened: ["large", "large"],
      lie: ["small 1"],
    },
  ])("$case", ({ copies, stock, opened, lie }) => {
    expect(exchanged(copies, stock, opened)).toEqual(lie);
  });
});
