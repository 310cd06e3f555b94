import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { create } from "fontkit";
import { unpackWoff } from "./unpack-woff.ts";

/** The family that stands in for every font a drawing names: the one the application ships. */
export const artworkFontFamily = "Merriweather";

const files = [
  "latin-400-normal",
  "latin-700-normal",
  "latin-400-italic",
  "latin-ext-400-normal",
  "latin-ext-700-normal",
];

export type ArtworkFonts = {
  readonly buffers: Uint8Array[];
  readonly hasLetter: (codePoint: number) => boolean;
};

let loading: Promise<ArtworkFonts> | undefined;

/** The shipped fonts as TrueType, for drawing text of SVG files. Read once, and only when a drawing holds text. */
export function loadArtworkFonts(): Promise<ArtworkFonts> {
  loading ??= readFonts();
  return loading;
}

async function readFonts(): Promise<ArtworkFonts> {
  const require = createRequire(import.meta.url);
  const buffers = await Promise.all(
    files.map(async (file) =>
      unpackWoff(await readFile(require.resolve(`@fontsource/merriweather/files/merriweather-${file}.woff`))),
    ),
  );
  const fonts = buffers.map((buffer) => create(buffer));
  return {
    buffers,
    hasLetter: (codePoint) =>
      fonts.some((font) => "hasGlyphForCodePoint" in font && font.hasGlyphForCodePoint(codePoint)),
  };
}
