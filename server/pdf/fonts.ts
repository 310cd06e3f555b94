import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import fontkit from "@pdf-lib/fontkit";
import type { PDFDocument, PDFFont } from "pdf-lib";
import type { Font } from "#shared/drawing/display-list.ts";

/**
 * The families ship cut by script; a letter is looked for in this order. Only .woff: pdf-lib draws an unsubsetted web font
 * invisibly, and subsetting a .woff2 throws in a timer where nothing can catch it.
 */
const scripts = ["latin", "latin-ext", "vietnamese", "cyrillic", "cyrillic-ext"] as const;
type Script = (typeof scripts)[number];

const faces: Readonly<
  Record<Font, { readonly family: "merriweather" | "merriweather-sans"; readonly weight: number }>
> = {
  serif: { family: "merriweather", weight: 400 },
  "serif-bold": { family: "merriweather", weight: 700 },
  "serif-black": { family: "merriweather", weight: 900 },
  sans: { family: "merriweather-sans", weight: 400 },
  "sans-semibold": { family: "merriweather-sans", weight: 600 },
};

/** Merriweather Sans has no Cyrillic in its base cut; the serif lends its letters. */
const serifOf: Readonly<Partial<Record<Font, Font>>> = { sans: "serif", "sans-semibold": "serif-bold" };

type OpenFont = ReturnType<(typeof fontkit)["create"]>;
type Cut = { readonly name: string; readonly bytes: Uint8Array; readonly font: OpenFont };

const resolve = createRequire(import.meta.url).resolve;
const cuts = new Map<string, Promise<Cut>>();

/** Digits of one width, so that columns of numbers line up. */
const features = { tnum: true };

function fontFile(face: Font, script: Script): string {
  const { family, weight } = faces[face];
  return `@fontsource/${family}/files/${family}-${script}-${weight}-normal.woff`;
}

async function readCut(file: string): Promise<Cut> {
  const bytes = await readFile(resolve(file));
  return { name: file, bytes, font: fontkit.create(bytes) };
}

/** Fonts are read once a process; a read that failed is not kept. */
function cutOf(file: string): Promise<Cut> {
  const known = cuts.get(file);
  if (known) return known;
  const reading = readCut(file);
  cuts.set(file, reading);
  reading.catch(() => cuts.delete(file));
  return reading;
}

/** Where the letters of a face are looked for, in order. */
function filesOf(face: Font): string[] {
  const lent = serifOf[face];
  const own = faces[face].family === "merriweather-sans" ? scripts.filter((script) => script !== "cyrillic") : scripts;
  return [...own.map((script) => fontFile(face, script)), ...(lent === undefined ? [] : [fontFile(lent, "cyrillic")])];
}

/** A stretch of text one font file can set; `cut` is null for characters that no file holds. */
export type Run = { readonly text: string; readonly cut: Cut | null };

/** Splits text by the font files that hold its letters, so that nothing is dropped without a word. */
export async function runsOfText(text: string, face: Font): Promise<Run[]> {
  const runs: { text: string; cut: Cut | null }[] = [];
  for (const character of text) {
    let found: Cut | null = null;
    for (const file of filesOf(face)) {
      const cut = await cutOf(file);
      if (!cut.font.hasGlyphForCodePoint(character.codePointAt(0) ?? 0)) continue;
      found = cut;
      break;
    }
    const last = runs.at(-1);
    if (last && last.cut === found) last.text += character;
    else runs.push({ text: character, cut: found });
  }
  return runs;
}

/** A glyph's advance and what kerning adds to it, in thousandths of the em. */
export type SetGlyph = { readonly advance: number; readonly kern: number };

/** How a font file sets a run: one entry a glyph, ligatures and kerning applied. */
export function glyphsOfRun(text: string, cut: Cut): SetGlyph[] {
  const { glyphs, positions } = cut.font.layout(text, features);
  const thousandths = 1000 / cut.font.unitsPerEm;
  return glyphs.map((glyph, index) => {
    const advance = glyph.advanceWidth * thousandths;
    return { advance, kern: (positions[index]?.xAdvance ?? glyph.advanceWidth) * thousandths - advance };
  });
}

/** A subset's name starts with six capitals and a plus (ISO 32000-1, 9.6.4): the same for the same file, so the bytes are too. */
function subsetTag(name: string): string {
  let sum = 7;
  for (const character of name) sum = (sum * 31 + (character.codePointAt(0) ?? 0)) % 308_915_776;
  let tag = "";
  for (let index = 0; index < 6; index += 1) {
    tag += String.fromCharCode(65 + (sum % 26));
    sum = Math.floor(sum / 26);
  }
  return tag;
}

/** Embeds a font file into one document as a subset. */
export function embedCut(document: PDFDocument, cut: Cut): Promise<PDFFont> {
  const customName = `${subsetTag(cut.name)}+${cut.font.postscriptName ?? "Lettering"}`;
  return document.embedFont(cut.bytes, { subset: true, customName, features });
}

export { fontkit };
