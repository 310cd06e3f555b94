import { readFileSync } from "node:fs";

const textOf = (name: string): string =>
  readFileSync(new URL(`../fixtures/reference/${name}`, import.meta.url), "utf8");

/** A table of tests/fixtures/reference in JSON, to be parsed by a schema. */
export const referenceJson = (name: string): unknown => JSON.parse(textOf(name));

/** A table of tests/fixtures/reference in CSV: one record a row, by the names of the first line. Lines with # are notes. */
export function referenceCsv(name: string): Readonly<Record<string, string>>[] {
  const [head = [], ...rows] = textOf(name)
    .split(/\r?\n/)
    .filter((line) => line && !line.startsWith("#"))
    .map(cellsOf);
  return rows.map((cells) => Object.fromEntries(head.map((column, index) => [column, cells[index] ?? ""])));
}

function cellsOf(line: string): string[] {
  return [...line.matchAll(/(?:^|,)(?:"([^"]*)"|([^,]*))/g)].map(([, quoted, plain]) => quoted ?? plain ?? "");
}

/** The value of an outcome; throws for one that was refused. */
export function resultOf<T>(outcome: { ok: true; value: T } | { ok: false; reason: { field: string } }): T {
  if (outcome.ok) return outcome.value;
  throw new Error(`Refused: ${outcome.reason.field}.`);
}
