import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";

/**
 * A fingerprint of files and folders by name, size and time of change; file contents are not read. It differs when a
 * file was edited, added, removed or renamed.
 * @param {string} root
 * @param {readonly string[]} paths relative to `root`; one that does not exist counts as absent
 * @returns {string} 64 hexadecimal digits
 */
export function fingerprint(root, paths) {
  const hash = createHash("sha256");
  for (const path of paths) addToHash(hash, root, path);
  return hash.digest("hex");
}

/**
 * @param {import("node:crypto").Hash} hash
 * @param {string} root
 * @param {string} path
 */
function addToHash(hash, root, path) {
  const full = join(root, path);
  if (!existsSync(full)) {
    hash.update(`${path}\0absent\0`);
    return;
  }
  const facts = statSync(full);
  if (facts.isDirectory()) {
    for (const name of readdirSync(full).sort()) addToHash(hash, root, `${path}/${name}`);
  } else {
    hash.update(`${path}\0${facts.size}\0${facts.mtimeMs}\0`);
  }
}

/**
 * The SHA-256 of a file's bytes.
 * @param {string} path
 * @returns {string} 64 hexadecimal digits
 */
export function fileHash(path) {
  return createHash("sha256").update(readFileSync(path)).digest("hex");
}

/**
 * What was stamped last, or undefined when nothing was.
 * @param {string} path
 * @returns {string | undefined}
 */
export function readStamp(path) {
  return existsSync(path) ? readFileSync(path, "utf8").trim() : undefined;
}

/**
 * @param {string} path
 * @param {string} stamp
 */
export function writeStamp(path, stamp) {
  mkdirSync(dirname(path), { recursive: true });
  writeFileSync(path, `${stamp}\n`);
}
