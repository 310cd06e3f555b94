import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { say, secondsSince } from "./log.mjs";
import { Problem } from "./problem.mjs";
import { run } from "./processes.mjs";

/**
 * @typedef {{ version?: string, integrity?: string, optional?: boolean }} LockedPackage
 * @typedef {Record<string, LockedPackage>} LockedPackages by folder ("node_modules/zod"); "" is the project itself
 */

/**
 * Whether what is installed is what the lock asks for. Packages marked optional may be absent: most of them are
 * binaries for other systems.
 * @param {LockedPackages} locked
 * @param {LockedPackages} installed
 */
export function matchesLock(locked, installed) {
  const missing = Object.entries(locked).some(([folder, wanted]) => {
    if (folder === "") return false;
    const found = installed[folder];
    if (found === undefined) return wanted.optional !== true;
    return found.version !== wanted.version || found.integrity !== wanted.integrity;
  });
  return !missing && Object.keys(installed).every((folder) => locked[folder] !== undefined);
}

/**
 * Whether node_modules is missing, half installed (npm writes its own list last) or made from another lock.
 * @param {string} root
 */
export function packagesNeedInstall(root) {
  const list = join(root, "node_modules", ".package-lock.json");
  return !existsSync(list) || !matchesLock(readPackages(join(root, "package-lock.json")), readPackages(list));
}

/**
 * @param {string} path
 * @returns {LockedPackages}
 */
function readPackages(path) {
  return JSON.parse(readFileSync(path, "utf8")).packages;
}

/**
 * Installs the locked packages when needed.
 * @param {string} root
 * @throws {Problem} when npm fails
 */
export async function ensurePackages(root) {
  if (!packagesNeedInstall(root)) return;
  const startedAt = performance.now();
  say("Installing the locked packages (npm ci) …");
  // Vite, Tailwind and the other build tools are development packages; NODE_ENV=production would leave them out.
  const { code } = await run("npm", ["ci", "--include=dev"], { cwd: root, shown: true });
  if (code !== 0) {
    throw new Problem(
      "npm ci failed; its own words are above. This step needs the npm registry, once per change of the lock.",
    );
  }
  say(`Packages installed in ${secondsSince(startedAt)} s.`);
}
