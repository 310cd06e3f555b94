import { spawn } from "node:child_process";
import { cpSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";

/**
 * One deliberate fault: in `file` the text `find`, which stands there once, becomes `replace`; one of `tests` must fail.
 * @typedef {{ file: string, find: string, replace: string, why: string, tests: readonly string[] }} Variant
 * @typedef {"caught" | "missed" | "stale" | "broken off"} Verdict
 */

/** Copied for the tests to run in; nothing outside the copy is written. */
const copied = ["package.json", "tsconfig.json", "shared", "server", "tests"];

/**
 * Makes each fault in a copy of the tree, one by one, and runs the tests that must catch it. A fault whose text is gone is
 * stale, and one whose tests could not run at all (a fault of syntax) proves nothing: both count as not caught.
 * @param {string} root
 * @param {readonly Variant[]} variants
 * @param {(line: string) => void} say
 * @returns {Promise<{ caught: number, others: { variant: Variant, verdict: Verdict }[] }>}
 * @throws {Error} when the tests fail without any fault
 */
export async function tryVariants(root, variants, say) {
  const folder = mkdtempSync(join(tmpdir(), "standproud-variants-"));
  try {
    for (const name of copied) cpSync(join(root, name), join(folder, name), { recursive: true });
    symlinkSync(join(root, "node_modules"), join(folder, "node_modules"));
    writeFileSync(join(folder, "vitest.config.mjs"), configOf(folder));
    const all = [...new Set(variants.flatMap(({ tests }) => tests))].sort();
    const sound = await runTests(folder, all);
    if (sound.failed > 0 || sound.passed === 0) throw new Error(`Without any fault the tests fail:\n${sound.output}`);
    say(`Without any fault ${sound.passed} tests of ${all.length} files pass.`);

    const others = [];
    for (const [index, variant] of variants.entries()) {
      const verdict = await tryVariant(folder, variant);
      say(`${index + 1}/${variants.length} ${verdict}: ${variant.file}, ${variant.why}`);
      if (verdict !== "caught") others.push({ variant, verdict });
    }
    return { caught: variants.length - others.length, others };
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/**
 * @param {string} folder
 * @param {Variant} variant
 * @returns {Promise<Verdict>}
 */
async function tryVariant(folder, { file, find, replace, tests }) {
  const path = join(folder, file);
  const sound = readFileSync(path, "utf8");
  if (sound.split(find).length !== 2) return "stale";
  writeFileSync(
    path,
    sound.replace(find, () => replace),
  );
  try {
    const { failed, passed } = await runTests(folder, tests);
    if (failed > 0) return "caught";
    return passed > 0 ? "missed" : "broken off";
  } finally {
    writeFileSync(path, sound);
  }
}

/**
 * @param {string} folder
 * @param {readonly string[]} files
 * @returns {Promise<{ passed: number, failed: number, output: string }>} single tests; none of either when none could run
 */
async function runTests(folder, files) {
  const program = join(folder, "node_modules", "vitest", "vitest.mjs");
  const report = join(folder, "report.json");
  rmSync(report, { force: true });
  const args = [program, "run", "--config=vitest.config.mjs", "--reporter=json", `--outputFile=${report}`, ...files];
  const child = spawn(process.execPath, args, { cwd: folder, stdio: ["ignore", "pipe", "pipe"] });
  let output = "";
  for (const stream of [child.stdout, child.stderr]) {
    stream.setEncoding("utf8");
    stream.on("data", (/** @type {string} */ text) => {
      output += text;
    });
  }
  await new Promise((done, fail) => {
    child.on("error", fail);
    child.on("close", done);
  });
  try {
    /** @type {{ numPassedTests: number, numFailedTests: number }} */
    const { numPassedTests: passed, numFailedTests: failed } = JSON.parse(readFileSync(report, "utf8"));
    return { passed, failed, output };
  } catch (error) {
    throw new Error(`The tests gave no report:\n${output}`, { cause: error });
  }
}

/**
 * @param {string} folder
 * @returns {string}
 */
function configOf(folder) {
  const alias = { "#shared": join(folder, "shared"), "#server": join(folder, "server") };
  // One process: a fault in one file needs no more, and the machine has other work.
  const test = { include: ["tests/**/*.test.ts"], maxWorkers: 1, isolate: false, testTimeout: 60_000 };
  return `export default ${JSON.stringify({ resolve: { alias }, test })};\n`;
}

/** @returns {readonly Variant[]} every fault of the list */
export function listVariants() {
  return JSON.parse(readFileSync(new URL("broken-variants.json", import.meta.url), "utf8"));
}

// By hand: node tests/support/broken-variants.mjs [text that the files' names contain]
if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const [, , wanted = ""] = process.argv;
  const variants = listVariants().filter(({ file }) => file.includes(wanted));
  const root = fileURLToPath(new URL("../..", import.meta.url));
  const { caught, others } = await tryVariants(root, variants, console.log);
  console.log(`${caught} of ${variants.length} caught`);
  process.exitCode = others.length > 0 ? 1 : 0;
}
