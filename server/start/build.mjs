import { existsSync, rmSync } from "node:fs";
import { join } from "node:path";
import { bundleServer } from "./bundle.mjs";
import { say, secondsSince } from "./log.mjs";
import { Problem } from "./problem.mjs";
import { run } from "./processes.mjs";
import { fingerprint, readStamp, writeStamp } from "./stamp.mjs";

/**
 * @typedef {object} Part
 * @property {string} name for the log
 * @property {string} result a file that exists when the part was built
 * @property {readonly string[]} sources what it is made from
 * @property {(root: string) => Promise<void>} make
 */

const common = ["shared", "package.json", "package-lock.json", "tsconfig.json", "server/start"];

/** @type {readonly Part[]} */
const parts = [
  {
    name: "client",
    result: "dist/client/index.html",
    sources: [...common, "src", "public", "index.html", "vite.config.ts", "tailwind.config.ts"],
    make: buildClient,
  },
  { name: "server", result: "dist/server/index.mjs", sources: [...common, "server"], make: bundleServer },
];

/**
 * Builds the parts whose sources changed since they were built, both at once.
 * @param {string} root the checkout
 * @throws {Problem} with the words of the tool that failed
 */
export async function ensureBuild(root) {
  const stale = parts.filter((part) => partIsStale(root, part));
  if (stale.length === 0) return;
  const startedAt = performance.now();
  say(`Building the ${stale.map(({ name }) => name).join(" and the ")} …`);
  const results = await Promise.allSettled(stale.map((part) => buildPart(root, part)));
  const failed = results.find((result) => result.status === "rejected");
  if (failed !== undefined) throw failed.reason;
  say(`Built in ${secondsSince(startedAt)} s.`);
}

/**
 * @param {string} root
 * @param {Part} part
 */
function partIsStale(root, { name, result, sources }) {
  return !existsSync(join(root, result)) || readStamp(stampFile(root, name)) !== fingerprint(root, sources);
}

/**
 * @param {string} root
 * @param {string} name
 */
const stampFile = (root, name) => join(root, "dist", `.${name}-stamp`);

/**
 * @param {string} root
 * @param {Part} part
 */
async function buildPart(root, { name, sources, make }) {
  // Taken before the build: a file saved while it runs makes the next start build again.
  const stamp = fingerprint(root, sources);
  rmSync(stampFile(root, name), { force: true });
  await make(root);
  writeStamp(stampFile(root, name), stamp);
}

/** @param {string} root */
async function buildClient(root) {
  const vite = join(root, "node_modules", "vite", "bin", "vite.js");
  // Whatever this process is: a test that builds must not get the slow, large one for development.
  const env = { ...process.env, NODE_ENV: "production" };
  const { code, output } = await run(process.execPath, [vite, "build", "--logLevel", "warn"], { cwd: root, env });
  if (code !== 0) throw new Problem(`The client could not be built:\n${output}`);
}
