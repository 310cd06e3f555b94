import { checkoutOf } from "../../server/start/data-folder.mjs";
import { Ended, listenForEnd } from "../../server/start/ending.mjs";
import { say, secondsSince } from "../../server/start/log.mjs";
import { ensurePackages } from "../../server/start/packages.mjs";
import { Problem } from "../../server/start/problem.mjs";
import { run } from "../../server/start/processes.mjs";
import { readOptions } from "./runner/options.mjs";
import { build, check, ensureTestPrograms, vitest } from "./runner/steps.mjs";
import { sumTallies } from "./runner/tally.mjs";
import { startThrowawayCluster } from "./throwaway-cluster.mjs";

/** @typedef {import("./runner/tally.mjs").Tally} Tally */

const needDatabase = ["api", "db", "e2e", "long"];
const needBuild = ["e2e", "long"];

/**
 * Types, style, build and an empty cluster side by side, then every test.
 * @param {string} root
 * @param {import("./runner/options.mjs").Options} options
 * @param {import("../../server/start/ending.mjs").Ending} ending
 * @returns {Promise<Tally>}
 */
async function test(root, { types, lint, projects, files }, ending) {
  const wantsDatabase = projects.some((name) => needDatabase.includes(name)) && files.length === 0;
  const wantsBuild = projects.some((name) => needBuild.includes(name)) && files.length === 0;
  const starting = wantsDatabase ? startThrowawayCluster() : undefined;
  try {
    const [typesTally, lintTally, buildTally] = await Promise.all([
      types ? check("Types", root, ["tsc", "--noEmit"]) : none,
      lint ? check("Style", root, ["biome", "check"]) : none,
      wantsBuild ? build(root) : none,
      starting,
    ]);
    ending.check();
    const runnable = buildTally.failed > 0 ? projects.filter((name) => !needBuild.includes(name)) : projects;
    const clusterUrl = (await starting)?.url;
    const testTally = runnable.length > 0 ? await vitest(root, { projects: runnable, files, clusterUrl }) : none;
    return sumTallies([typesTally, lintTally, buildTally, testTally]);
  } finally {
    await starting?.then(
      (cluster) => cluster.stop(),
      () => undefined,
    );
  }
}

/** @type {Tally} */
const none = { passed: 0, failed: 0, remarks: [] };

/**
 * Measures everything in tests/bench; what it prints last is one JSON object.
 * @param {string} root
 * @returns {Promise<number>} an exit code
 */
async function bench(root) {
  const buildTally = await build(root);
  if (buildTally.failed > 0) return 1;
  const cluster = await startThrowawayCluster();
  try {
    const env = { ...process.env, TEST_CLUSTER_URL: cluster.url };
    const { code } = await run(process.execPath, ["--import", "tsx", "tests/support/bench.ts"], {
      cwd: root,
      env,
      shown: true,
    });
    return code;
  } finally {
    await cluster.stop();
  }
}

/** Installs what is missing, runs what was asked for and sets the exit code; the totals are the last line. */
async function main() {
  const startedAt = performance.now();
  const ending = listenForEnd();
  const root = checkoutOf(import.meta.url);
  /** @type {Tally} */
  let tally;
  try {
    const options = readOptions(process.argv.slice(2));
    await ensurePackages(root);
    await ensureTestPrograms();
    ending.check();
    if (options.bench) {
      process.exitCode = await bench(root);
      return;
    }
    tally = await test(root, options, ending);
  } catch (error) {
    const words = error instanceof Problem ? error.message : error instanceof Error ? error.stack : String(error);
    tally = { passed: 0, failed: 1, remarks: [error instanceof Ended ? "Stopped before the end." : (words ?? "")] };
  }
  if (ending.isAsked()) tally = { ...tally, failed: Math.max(1, tally.failed) };
  for (const remark of tally.remarks) say(remark);
  say(`Finished in ${secondsSince(startedAt)} s.\n\n${tally.passed} passed, ${tally.failed} failed`);
  if (tally.failed > 0) process.exitCode = 1;
}

await main();
