import { appendFileSync } from "node:fs";
import { expect, inject } from "vitest";
// Brings the name of what is injected.
import type {} from "./reference-table.ts";

type Row = {
  readonly what: string;
  /** Published source, "common practice" or "calculated". */
  readonly source: string;
  readonly expected: number;
  readonly got: number;
  /** How far the two may lie apart: what the source was rounded by, in the value's unit. */
  readonly within: number;
};

/** Expects a computed value to be the published one, and puts both into the table at the end of the reference run. */
export function checkReference({ what, source, expected, got, within }: Row): void {
  writeRow([source, what, text(expected), text(got)]);
  // The hair is for the two sides' own last digits.
  const off = Math.abs(got - expected);
  expect(off, `${what}: ${got} is ${off} off ${expected}`).toBeLessThanOrEqual(within + 1e-12 * Math.abs(expected));
}

/** The same for words, as a verdict. */
export function checkReferenceWord(row: Pick<Row, "what" | "source"> & { expected: string; got: string }): void {
  writeRow([row.source, row.what, row.expected, row.got]);
  expect(row.got, row.what).toBe(row.expected);
}

function writeRow(cells: readonly string[]): void {
  const file = inject("referenceRows");
  if (file) appendFileSync(file, `${cells.join("\t")}\n`);
}

const text = (value: number): string => String(Number(value.toPrecision(6)));
