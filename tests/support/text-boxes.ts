import { createRequire } from "node:module";
import * as fontkit from "fontkit";
import type { DisplayList, Font, Item } from "#shared/drawing/display-list.ts";
import { groupMatrixInside } from "#shared/drawing/group-matrix.ts";
import type { Box } from "#shared/geometry/path.ts";
import { identityMatrix, type Matrix, pointTransform } from "#shared/geometry/transform.ts";

const require = createRequire(import.meta.url);

const files: Readonly<Record<Font, string>> = {
  serif: "@fontsource/merriweather/files/merriweather-latin-400-normal.woff",
  "serif-bold": "@fontsource/merriweather/files/merriweather-latin-700-normal.woff",
  "serif-black": "@fontsource/merriweather/files/merriweather-latin-900-normal.woff",
  sans: "@fontsource/merriweather-sans/files/merriweather-sans-latin-400-normal.woff",
  "sans-semibold": "@fontsource/merriweather-sans/files/merriweather-sans-latin-600-normal.woff",
};

const opened = new Map<Font, fontkit.Font>();

/** The font file itself, opened once. */
export function openFont(font: Font): fontkit.Font {
  const known = opened.get(font);
  if (known) return known;
  const file = fontkit.openSync(require.resolve(files[font]));
  if (!("layout" in file)) throw new Error(`${files[font]} holds a collection.`);
  opened.set(font, file);
  return file;
}

/** Width of a line as the font sets it, kerning included, digits tabular, for an em of 1. */
export function setWidth(text: string, font: Font): number {
  const file = openFont(font);
  return file.layout(text, ["tnum"]).advanceWidth / file.unitsPerEm;
}

export type TextBox = { readonly text: string; readonly box: Box; readonly sizeMm: number };

/** Where every line of a list stands in its own mm, capitals and descenders included. Only level and quarter-turned text. */
export function textBoxesOf(list: DisplayList): TextBox[] {
  return boxesIn(list.items, identityMatrix);
}

function boxesIn(items: readonly Item[], matrix: Matrix): TextBox[] {
  return items.flatMap((item): TextBox[] => {
    if (item.kind === "group") return boxesIn(item.items, groupMatrixInside(matrix, item));
    if (item.kind === "clip") return boxesIn(item.items, matrix);
    if (item.kind !== "text") return [];
    const size = item.sizeMm * matrix.a;
    const at = pointTransform(item.at, matrix);
    const width = setWidth(item.text, item.font) * size;
    const from = { left: 0, middle: -width / 2, right: -width }[item.align];
    const level = { x: from, y: -0.743 * size, width, height: 0.93 * size };
    const turn = item.turn ?? 0;
    if (turn === 0) return [{ text: item.text, sizeMm: size, box: { ...level, x: at.x + level.x, y: at.y + level.y } }];
    if (turn !== -90) throw new Error(`No box for text turned by ${turn}.`);
    // A quarter turn to the left takes (x, y) to (y, −x).
    const box = { x: at.x + level.y, y: at.y - level.x - width, width: level.height, height: width };
    return [{ text: item.text, sizeMm: size, box }];
  });
}
