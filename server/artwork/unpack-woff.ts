import { inflateSync } from "node:zlib";

const woffHeader = 44;
const woffEntry = 20;
const sfntHeader = 12;
const sfntEntry = 16;

/**
 * The TrueType file inside a WOFF 1.0 file (WOFF File Format 1.0, sections 3 to 5): the same tables, inflated where they are
 * compressed, under a plain table directory. Throws an Error when the bytes are not WOFF.
 */
export function unpackWoff(woff: Buffer): Buffer {
  if (woff.length < woffHeader || woff.toString("latin1", 0, 4) !== "wOFF") throw new Error("Not a WOFF file.");
  const count = woff.readUInt16BE(12);
  const directory = Buffer.alloc(sfntHeader + sfntEntry * count);
  woff.copy(directory, 0, 4, 8);
  const powers = Math.floor(Math.log2(count));
  directory.writeUInt16BE(count, 4);
  directory.writeUInt16BE(sfntEntry * 2 ** powers, 6);
  directory.writeUInt16BE(powers, 8);
  directory.writeUInt16BE(sfntEntry * (count - 2 ** powers), 10);

  const tables: Buffer[] = [];
  let at = directory.length;
  for (let index = 0; index < count; index++) {
    const entry = woffHeader + woffEntry * index;
    const offset = woff.readUInt32BE(entry + 4);
    const packed = woff.readUInt32BE(entry + 8);
    const length = woff.readUInt32BE(entry + 12);
    const raw = woff.subarray(offset, offset + packed);
    // Tables start on multiples of four bytes.
    const table = Buffer.alloc(Math.ceil(length / 4) * 4);
    (packed < length ? inflateSync(raw) : raw).copy(table);
    const written = sfntHeader + sfntEntry * index;
    woff.copy(directory, written, entry, entry + 4);
    woff.copy(directory, written + 4, entry + 16, entry + 20);
    directory.writeUInt32BE(at, written + 8);
    directory.writeUInt32BE(length, written + 12);
    tables.push(table);
    at += table.length;
  }
  return Buffer.concat([directory, ...tables]);
}
