import { expect } from "vitest";
import { printTable } from "./print-table.ts";
import { type Agreement, type Drawing, traceAgreements } from "./trace-agreement.ts";

const meanOf = (rows: readonly Agreement[]): number => rows.reduce((sum, { mean }) => sum + mean, 0) / rows.length;

/** Traces drawings from both formats, prints how well they agree, and returns the rows and their mean. */
export async function tracedFrom(
  drawings: readonly Drawing[],
  format: "png" | "jpeg",
): Promise<{ readonly rows: readonly Agreement[]; readonly mean: number }> {
  const rows = await traceAgreements(drawings, format);
  expect(rows).toHaveLength(drawings.length);
  const worst = rows.toSorted((a, b) => a.worst - b.worst).slice(0, 3);
  printTable(`Traced from ${format.toUpperCase()}: ${rows.length} drawings, mean ${meanOf(rows).toFixed(4)}`, [
    ["worst", "mean", "worst colour", "colours", "found", "nodes"],
    ...worst.map((row) => [row.name, row.mean.toFixed(4), row.worst.toFixed(3), row.drawn, row.found, row.nodes]),
  ]);
  return { rows, mean: meanOf(rows) };
}
