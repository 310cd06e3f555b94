import { readFileSync } from "node:fs";
import { create, type Font } from "fontkit";
import { faceOf } from "#shared/lettering/faces.ts";
import { type OpenFace, openFace } from "#shared/lettering/open-face.ts";

const opened = new Map<string, OpenFace>();

/** The bytes of a face's file, as it is shipped. */
export function fileOfFace(key: string): Buffer {
  const face = faceOf(key);
  if (!face) throw new Error(`There is no face ${key}.`);
  return readFileSync(new URL(`../../node_modules/${face.package}/${face.file}`, import.meta.url));
}

/** A face's font as fontkit reads it. */
export function fontOfFace(key: string): Font {
  const font = create(fileOfFace(key));
  if (!("layout" in font)) throw new Error(`${key} is a collection, not a font.`);
  return font;
}

/** A shipped face, opened once. */
export function openFaceOf(key: string): OpenFace {
  const known = opened.get(key) ?? openFace(() => fontOfFace(key));
  opened.set(key, known);
  return known;
}
