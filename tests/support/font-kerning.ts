/**
 * What a font's own tables say of two glyphs that follow each other: how much kerning moves the second, in font units; 0 when
 * they say nothing. Reads the bytes of a TrueType file after the OpenType specification, without a font library: GPOS where there
 * is one, else the older kern table.
 */
export function fontKerning(ttf: Buffer, first: number, second: number): number {
  const gpos = tableAt(ttf, "GPOS");
  if (gpos !== null) return gposKerning(ttf, gpos, first, second);
  const kern = tableAt(ttf, "kern");
  if (kern === null) throw new Error("The font has neither GPOS nor kern.");
  return pairKerning(ttf, kern, first, second);
}

/** "kern", version 0, its first subtable in format 0: pairs in order, each with the distance between them. */
function pairKerning(ttf: Buffer, kern: number, first: number, second: number): number {
  const pairs = kern + 4 + 14;
  for (let index = 0; index < ttf.readUInt16BE(kern + 4 + 6); index++) {
    const at = pairs + 6 * index;
    if (ttf.readUInt16BE(at) === first && ttf.readUInt16BE(at + 2) === second) return ttf.readInt16BE(at + 4);
  }
  return 0;
}

/**
 * The "kern" feature of GPOS: Lookup Type 2 "Pair Adjustment" with formats 1 and 2, Lookup Type 9 "Extension"; Coverage and
 * ClassDef tables of "OpenType Layout Common Table Formats".
 */
function gposKerning(ttf: Buffer, gpos: number, first: number, second: number): number {
  const u16 = (at: number) => ttf.readUInt16BE(at);
  const list = (at: number) => Array.from({ length: u16(at) }, (_, index) => u16(at + 2 + 2 * index));
  const features = gpos + u16(gpos + 6);
  const lookups = gpos + u16(gpos + 8);
  const wanted = new Set<number>();
  for (let index = 0; index < u16(features); index++) {
    const record = features + 2 + 6 * index;
    if (ttf.toString("latin1", record, record + 4) !== "kern") continue;
    for (const lookup of list(features + u16(record + 4) + 2)) wanted.add(lookup);
  }
  for (const index of [...wanted].sort((a, b) => a - b)) {
    const lookup = lookups + u16(lookups + 2 + 2 * index);
    for (const offset of list(lookup + 4)) {
      const outer = lookup + offset;
      const isExtension = u16(lookup) === 9;
      if ((isExtension ? u16(outer + 2) : u16(lookup)) !== 2) continue;
      const found = pairAdvance(ttf, isExtension ? outer + ttf.readUInt32BE(outer + 4) : outer, first, second);
      // Of the subtables of a lookup the first one that knows the pair is taken.
      if (found !== null) return found;
    }
  }
  return 0;
}

function tableAt(ttf: Buffer, tag: string): number | null {
  for (let index = 0; index < ttf.readUInt16BE(4); index++) {
    const record = 12 + 16 * index;
    if (ttf.toString("latin1", record, record + 4) === tag) return ttf.readUInt32BE(record + 8);
  }
  return null;
}

/** The advance that a pair subtable adds to the first glyph; null when it does not know the pair. */
function pairAdvance(ttf: Buffer, at: number, first: number, second: number): number | null {
  const u16 = (place: number) => ttf.readUInt16BE(place);
  const covered = coverageIndex(ttf, at + u16(at + 2), first);
  if (covered === null) return null;
  const [format1, format2] = [u16(at + 4), u16(at + 6)];
  // A value record has two bytes a bit; XAdvance is the third of them.
  const size = (format: number) => 2 * [...format.toString(2)].filter((bit) => bit === "1").length;
  const advance = (record: number) => ((format1 & 4) === 0 ? 0 : ttf.readInt16BE(record + size(format1 & 3)));
  if (u16(at) === 1) {
    const set = at + u16(at + 10 + 2 * covered);
    const step = 2 + size(format1) + size(format2);
    for (let index = 0; index < u16(set); index++)
      if (u16(set + 2 + step * index) === second) return advance(set + 4 + step * index);
    return null;
  }
  const step = size(format1) + size(format2);
  const row = classOf(ttf, at + u16(at + 8), first) * u16(at + 14);
  return advance(at + 16 + step * (row + classOf(ttf, at + u16(at + 10), second)));
}

function coverageIndex(ttf: Buffer, at: number, glyph: number): number | null {
  const u16 = (place: number) => ttf.readUInt16BE(place);
  for (let index = 0; index < u16(at + 2); index++) {
    if (u16(at) === 1 && u16(at + 4 + 2 * index) === glyph) return index;
    const range = at + 4 + 6 * index;
    if (u16(at) === 2 && glyph >= u16(range) && glyph <= u16(range + 2)) return u16(range + 4) + glyph - u16(range);
  }
  return null;
}

function classOf(ttf: Buffer, at: number, glyph: number): number {
  const u16 = (place: number) => ttf.readUInt16BE(place);
  if (u16(at) === 1) {
    const index = glyph - u16(at + 2);
    return index >= 0 && index < u16(at + 4) ? u16(at + 6 + 2 * index) : 0;
  }
  for (let index = 0; index < u16(at + 2); index++) {
    const range = at + 4 + 6 * index;
    if (glyph >= u16(range) && glyph <= u16(range + 2)) return u16(range + 4);
  }
  return 0;
}
