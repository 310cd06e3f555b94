import { longestMm } from "./schema-parts.ts";

type Json = Readonly<Record<string, unknown>>;

/**
 * How many pieces, holes, rings and segments of a posted document the schema would find gross fault with, counted up to `most`. A
 * schema collects every fault, and of a few megabytes of nonsense that is gigabytes; this looks and keeps nothing. Never throws.
 */
export function badPlaces(document: unknown, most: number): number {
  const { board, layers } = recordOf(document);
  const outline = recordOf(recordOf(board).outline);
  const pieces = listOf(layers).flatMap((layer) => listOf(recordOf(layer).pieces));
  const holes = listOf(layers).flatMap((layer) => listOf(recordOf(recordOf(layer).hold).holes));
  let count = pieces.filter((piece) => !isPiece(piece)).length + holes.filter((hole) => !isHole(hole)).length;
  for (const { path } of [outline, ...pieces.map(recordOf)]) {
    for (const ring of listOf(path)) {
      if (count >= most) return most;
      const { start, segments } = recordOf(ring);
      if (!isPoint(start) || !Array.isArray(segments)) count += 1;
      for (const segment of listOf(segments)) {
        if (count >= most) return most;
        if (!isSegment(segment)) count += 1;
      }
    }
  }
  return Math.min(count, most);
}

const sources: readonly unknown[] = ["artwork", "plate", "lettering", "margin", "worked"];

function isPiece(value: unknown): boolean {
  const { id, name, source, path, placement, reads, ...rest } = recordOf(value);
  const { x, y, turn, scale, mirrored } = recordOf(placement);
  return (
    isId(id) &&
    [name, reads].every((text) => typeof text === "string") &&
    [x, y, turn, scale].every((number) => typeof number === "number") &&
    typeof mirrored === "boolean" &&
    sources.includes(recordOf(source).kind) &&
    Array.isArray(path) &&
    Object.keys(rest).length === 0
  );
}

function isHole(value: unknown): boolean {
  const { id, x, y, diameter, fixed, ...rest } = recordOf(value);
  return (
    isId(id) &&
    [x, y, diameter].every((number) => typeof number === "number") &&
    typeof fixed === "boolean" &&
    Object.keys(rest).length === 0
  );
}

const isId = (value: unknown): boolean => typeof value === "string" && value.length >= 1 && value.length <= 64;

function isSegment(value: unknown): boolean {
  const { kind, to, c1, c2, ...rest } = recordOf(value);
  if (Object.keys(rest).length > 0 || !isPoint(to)) return false;
  return kind === "line" ? c1 === undefined && c2 === undefined : kind === "cubic" && isPoint(c1) && isPoint(c2);
}

function isPoint(value: unknown): boolean {
  const { x, y, ...rest } = recordOf(value);
  return isCoordinate(x) && isCoordinate(y) && Object.keys(rest).length === 0;
}

const isCoordinate = (value: unknown): boolean => typeof value === "number" && Math.abs(value) <= longestMm;

const nothing: Json = {};
const recordOf = (value: unknown): Json =>
  typeof value === "object" && value !== null && !Array.isArray(value) ? (value as Json) : nothing;
const listOf = (value: unknown): readonly unknown[] => (Array.isArray(value) ? value : []);
