/** What one artwork file may hold. Past these we refuse in words instead of working without an end. */
export const artworkLimits = {
  /** Bytes of the file as brought, and of its text after unpacking. */
  fileBytes: 10_000_000,
  textBytes: 16_000_000,
  /** Bytes that the packed streams of a PDF may hold together. */
  unpackedBytes: 100_000_000,
  elements: 100_000,
  depth: 200,
  entities: 50,
  entityLength: 200,
  entityUses: 10_000,
  paths: 20_000,
  /** Points after flattening, all paths together. */
  vertices: 400_000,
  dashes: 20_000,
  pieces: 5_000,
  timeMs: 5_000,
  /** A picture, before it is decoded: all its pixels, its shorter side, and what tracing it may take. */
  picturePixels: 40_000_000,
  pictureSide: 16,
  pictureTimeMs: 60_000,
  /** Connected areas of one colour: of the traced picture before specks are taken out, and of those left, with the ones that become no pieces. */
  pictureAreas: 500_000,
  pictureOutlines: 40_000,
  memoryMb: 512,
} as const;
