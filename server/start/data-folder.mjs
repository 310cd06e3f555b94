import { createHash, randomBytes } from "node:crypto";
import {
  chmodSync,
  closeSync,
  existsSync,
  fsyncSync,
  mkdirSync,
  openSync,
  readFileSync,
  realpathSync,
  renameSync,
  writeSync,
} from "node:fs";
import { homedir } from "node:os";
import { basename, dirname, join, resolve } from "node:path";
import { fileURLToPath } from "node:url";
import { isRoot } from "./debian.mjs";
import { Problem } from "./problem.mjs";

/**
 * Where the database and the secrets of one checkout live: outside the checkout, so that cleaning or cloning it loses
 * nothing, and outside the temp folder, which a restart may empty. As root it must be a place the postgres user can
 * reach, which root's home is not.
 * @param {string} root the checkout
 * @param {NodeJS.ProcessEnv} env STANDPROUD_DATA names the folder itself; XDG_DATA_HOME a user's data folder
 * @param {{ asRoot?: boolean }} [options]
 * @returns {string} an absolute path
 */
export function dataFolder(root, env, { asRoot = isRoot() } = {}) {
  if (env.STANDPROUD_DATA) return resolve(root, env.STANDPROUD_DATA);
  const base = asRoot ? "/var/lib" : env.XDG_DATA_HOME || join(env.HOME || homedir(), ".local", "share");
  return join(base, "standproud", checkoutName(root));
}

/**
 * A folder name for a checkout: its own name for the reader, a hash of its whole path to tell two of that name apart.
 * @param {string} root
 */
export function checkoutName(root) {
  const name = basename(root)
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, "-");
  return `${name}-${createHash("sha256").update(root).digest("hex").slice(0, 12)}`;
}

/**
 * Makes the folder when it is missing. As root others may pass through it (the postgres user must), but not list it.
 * @param {string} folder
 * @throws {Problem} when this user may not write there
 */
export function makeDataFolder(folder) {
  try {
    mkdirSync(folder, { recursive: true, mode: isRoot() ? 0o711 : 0o700 });
  } catch (error) {
    throw new Problem(
      `The data folder ${folder} can't be made (${error instanceof Error ? error.message : error}). Set STANDPROUD_DATA to a folder of your own.`,
    );
  }
}

/**
 * @typedef {object} Secrets
 * @property {string} superuser password of the cluster's superuser, used only to make roles and the database
 * @property {string} owner password of the role that owns the tables
 * @property {string} app password of the role the application runs with
 * @property {string} auth the key that signs sessions; sign-ins outlive a restart only if it stays the same
 */

/** @param {string} folder */
export const secretsFile = (folder) => join(folder, "secrets.json");

/**
 * The passwords and keys of this checkout, made by chance once and kept in a file only its owner can read.
 * @param {string} folder an existing data folder
 * @returns {Secrets}
 * @throws {Problem} when they are gone although a database that knows them is still there
 */
export function readOrMakeSecrets(folder) {
  const path = secretsFile(folder);
  if (existsSync(path)) {
    chmodSync(path, 0o600);
    return JSON.parse(readFileSync(path, "utf8"));
  }
  if (existsSync(join(folder, "pgdata"))) {
    throw new Problem(
      `${path} is missing, but the database beside it needs its passwords. Put the file back from a backup, or move the folder away to begin anew.`,
    );
  }
  const made = () => randomBytes(32).toString("hex");
  const secrets = { superuser: made(), owner: made(), app: made(), auth: made() };
  writeDurably(path, `${JSON.stringify(secrets, null, 2)}\n`);
  return secrets;
}

/**
 * Writes a file of mode 0600 so that after a power cut it is either absent or whole.
 * @param {string} path
 * @param {string} text
 */
export function writeDurably(path, text) {
  const unfinished = `${path}.new`;
  const file = openSync(unfinished, "w", 0o600);
  try {
    writeSync(file, text);
    fsyncSync(file);
  } finally {
    closeSync(file);
  }
  renameSync(unfinished, path);
  syncFolder(dirname(path));
}

/**
 * Makes a rename inside a folder last through a power cut.
 * @param {string} folder
 */
export function syncFolder(folder) {
  const handle = openSync(folder, "r");
  try {
    fsyncSync(handle);
  } finally {
    closeSync(handle);
  }
}

/** @param {string} url of the module that asks; the checkout is two folders above server/start and tests/support */
export function checkoutOf(url) {
  return realpathSync(join(dirname(fileURLToPath(url)), "..", ".."));
}
