import { relative } from "node:path";

/**
 * Writes one line of the start script's own story; the application's log lines are JSON and stay apart from it.
 * @param {string} text
 */
export function say(text) {
  process.stdout.write(`${text}\n`);
}

/**
 * A path as a reader of the log wants it: relative to the checkout when inside it, absolute otherwise.
 * @param {string} root
 * @param {string} path
 */
export function shownPath(root, path) {
  const inside = relative(root, path);
  return inside !== "" && !inside.startsWith("..") ? inside : path;
}

/**
 * Seconds since `startedAt` (from performance.now), with one decimal.
 * @param {number} startedAt
 */
export function secondsSince(startedAt) {
  return ((performance.now() - startedAt) / 1000).toFixed(1);
}
