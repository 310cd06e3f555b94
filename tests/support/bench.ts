import { readdirSync } from "node:fs";
import { cpus } from "node:os";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import { checkoutOf } from "#server/start/data-folder.mjs";
import type { Measure, Measurement } from "./benchmark.ts";
import { ensureTemplate } from "./template-database.ts";

const columns = ["median", "p95", "min", "max"] as const;

/** Three significant digits, without an exponent. */
function shown(value: number): string {
  return value >= 100 ? String(Math.round(value)) : String(Number(value.toPrecision(3)));
}

/** The measurements as a table of plain text. */
function table(results: readonly Measurement[]): string {
  const rows = [
    ["what", ...columns, "unit", "runs"],
    ...results.map((result) => [
      result.name,
      ...columns.map((column) => shown(result[column])),
      result.unit,
      String(result.runs),
    ]),
  ];
  const widths = rows[0]?.map((_, column) => Math.max(...rows.map((row) => row[column]?.length ?? 0))) ?? [];
  return rows
    .map((row) =>
      row
        .map((cell, column) => (column === 0 ? cell.padEnd(widths[0] ?? 0) : cell.padStart(widths[column] ?? 0)))
        .join("  "),
    )
    .join("\n");
}

/** Runs every file of tests/bench in the order of their names, one after the other so that they do not disturb each other. */
async function main(): Promise<void> {
  const folder = join(checkoutOf(import.meta.url), "tests", "bench");
  const files = readdirSync(folder)
    .filter((name) => name.endsWith(".ts"))
    .sort();
  if (process.env.TEST_CLUSTER_URL !== undefined) await ensureTemplate(process.env.TEST_CLUSTER_URL);
  const results: Measurement[] = [];
  for (const file of files) {
    const { measure }: { measure?: Measure } = await import(pathToFileURL(join(folder, file)).href);
    if (measure === undefined) throw new Error(`tests/bench/${file} does not export measure().`);
    results.push(...(await measure()));
  }
  if (results.length === 0) throw new Error("Nothing was measured.");
  console.log(`\n${table(results)}\n`);
  console.log(JSON.stringify({ node: process.version, cpus: cpus().length, cpu: cpus()[0]?.model ?? "", results }));
}

await main();
