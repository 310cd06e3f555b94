import { existsSync, mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { ensureBuild } from "../../../server/start/build.mjs";
import { installDebianPackages } from "../../../server/start/debian.mjs";
import { say, secondsSince } from "../../../server/start/log.mjs";
import { Problem } from "../../../server/start/problem.mjs";
import { run } from "../../../server/start/processes.mjs";
import { countVitest } from "./tally.mjs";

/** @typedef {import("./tally.mjs").Tally} Tally */

/**
 * Installs what the browser tests and the reading back of PDF files need, where it is missing.
 * @throws {Problem} when it can't
 */
export async function ensureTestPrograms() {
  const missing = [];
  if (!existsSync(process.env.CHROMIUM_PATH ?? "/usr/bin/chromium")) missing.push("chromium");
  if ((await run("pdftoppm", ["-v"])).code === 127) missing.push("poppler-utils");
  if (missing.length > 0) await installDebianPackages(missing, "the browser and PDF tests");
}

/**
 * Runs one checking program; it counts as one test.
 * @param {string} title
 * @param {string} root
 * @param {readonly [string, ...string[]]} command a program of node_modules/.bin and what it gets
 * @returns {Promise<Tally>}
 */
export async function check(title, root, [program, ...args]) {
  const startedAt = performance.now();
  const { code, output } = await run(join(root, "node_modules", ".bin", program), args, { cwd: root });
  if (code === 0) {
    say(`${title}: passed (${secondsSince(startedAt)} s)`);
    return { passed: 1, failed: 0, remarks: [] };
  }
  say(`${title}: FAILED (${secondsSince(startedAt)} s)\n${output}`);
  return { passed: 0, failed: 1, remarks: [`${title} failed.`] };
}

/**
 * Builds what the browser tests open. It counts only when it fails.
 * @param {string} root
 * @returns {Promise<Tally>}
 */
export async function build(root) {
  try {
    await ensureBuild(root);
    return { passed: 0, failed: 0, remarks: [] };
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    say(error.message);
    return { passed: 0, failed: 1, remarks: ["The build failed, so the browser tests were not run."] };
  }
}

/**
 * Runs vitest over some projects.
 * @param {string} root
 * @param {{ projects: readonly string[], files: readonly string[], clusterUrl: string | undefined }} options
 * @returns {Promise<Tally>}
 */
export async function vitest(root, { projects, files, clusterUrl }) {
  const folder = mkdtempSync(join(tmpdir(), "standproud-report-"));
  const reportFile = join(folder, "report.json");
  try {
    const args = [
      "run",
      ...projects.map((name) => `--project=${name}`),
      "--reporter=default",
      "--reporter=json",
      `--outputFile.json=${reportFile}`,
      ...files,
    ];
    const env = {
      ...process.env,
      ...(clusterUrl === undefined ? {} : { TEST_CLUSTER_URL: clusterUrl }),
      ...(projects.includes("long") ? { TEST_LONG: "1" } : {}),
    };
    const { code } = await run(join(root, "node_modules", ".bin", "vitest"), args, { cwd: root, env, shown: true });
    return countVitest(existsSync(reportFile) ? JSON.parse(readFileSync(reportFile, "utf8")) : undefined, code);
  } finally {
    rmSync(folder, { recursive: true });
  }
}
