import { existsSync, mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { TestProject } from "vitest/node";
import { printTable } from "./print-table.ts";

declare module "vitest" {
  export interface ProvidedContext {
    /** The file that checks against published values write their rows to. */
    referenceRows: string;
  }
}

let folder: string | undefined;

export function setup(project: TestProject): void {
  folder = mkdtempSync(join(tmpdir(), "standproud-reference-"));
  project.provide("referenceRows", join(folder, "rows"));
}

/** Prints what was checked against published values, once, when all of them were. */
export function teardown(): void {
  if (folder === undefined) return;
  const file = join(folder, "rows");
  const rows = existsSync(file) ? readFileSync(file, "utf8").trimEnd().split("\n") : [];
  rmSync(folder, { recursive: true });
  if (rows.length === 0) return;
  // Source last, since it is the widest; rows of one source together.
  const table = rows
    .sort()
    .map((row) => row.split("\t"))
    .map(([source = "", what = "", expected = "", got = ""]) => [what, expected, got, source]);
  printTable(`Against the world outside: ${rows.length} values`, [["what", "expected", "got", "source"], ...table]);
}
