import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { sha256Hex } from "../files/sha256.ts";

const require = createRequire(import.meta.url);

/** The font files that drawings are lettered with, by the name the display lists use. */
export const fontFiles = {
  serif: "@fontsource/merriweather/files/merriweather-latin-400-normal.woff",
  "serif-bold": "@fontsource/merriweather/files/merriweather-latin-700-normal.woff",
  "serif-black": "@fontsource/merriweather/files/merriweather-latin-900-normal.woff",
  sans: "@fontsource/merriweather-sans/files/merriweather-sans-latin-400-normal.woff",
  "sans-semibold": "@fontsource/merriweather-sans/files/merriweather-sans-latin-600-normal.woff",
} as const;

let hashes: Readonly<Record<string, string>> | undefined;

/** SHA-256 of each font, so that a frozen drawing says what it was lettered with. */
export function fontHashes(): Readonly<Record<string, string>> {
  hashes ??= Object.fromEntries(
    Object.entries(fontFiles).map(([font, file]) => [font, sha256Hex(readFileSync(require.resolve(file)))]),
  );
  return hashes;
}
