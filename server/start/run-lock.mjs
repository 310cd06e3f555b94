import { existsSync, readFileSync, rmSync } from "node:fs";
import { join } from "node:path";
import { writeDurably } from "./data-folder.mjs";
import { say } from "./log.mjs";
import { Problem } from "./problem.mjs";
import { commandLine, isAlive, waitUntilGone } from "./processes.mjs";

/** @typedef {{ start: number, children: { pid: number, what: string }[] }} RunRecord */

/** @param {string} folder */
const recordFile = (folder) => join(folder, "running.json");

/**
 * Makes sure that one start at a time uses a data folder, and ends what a start that was killed left running.
 * @param {string} folder an existing data folder
 * @throws {Problem} when another start of this checkout is running
 */
export async function takeFolder(folder) {
  const before = readRecord(folder);
  if (before !== undefined) {
    if (before.start !== process.pid && isAlive(before.start) && commandLine(before.start).includes("start.mjs")) {
      throw new Problem(
        `Standproud is already running from this checkout (process ${before.start}). Stop it with Ctrl-C in its terminal, or: kill ${before.start}`,
      );
    }
    for (const { pid, what } of before.children) await endLeftover(pid, what);
  }
  recordChildren(folder, []);
}

/**
 * Remembers what was started, so that it can be found should this process be killed.
 * @param {string} folder
 * @param {RunRecord["children"]} children
 */
export function recordChildren(folder, children) {
  writeDurably(recordFile(folder), `${JSON.stringify({ start: process.pid, children })}\n`);
}

/** @param {string} folder */
export function leaveFolder(folder) {
  rmSync(recordFile(folder), { force: true });
}

/**
 * @param {string} folder
 * @returns {RunRecord | undefined}
 */
function readRecord(folder) {
  return existsSync(recordFile(folder)) ? JSON.parse(readFileSync(recordFile(folder), "utf8")) : undefined;
}

/**
 * @param {number} pid
 * @param {string} what the script it runs; another program may have got the number since
 */
async function endLeftover(pid, what) {
  if (!isAlive(pid) || !commandLine(pid).includes(what)) return;
  say(`Ending what an earlier start left running (process ${pid}).`);
  process.kill(pid, "SIGTERM");
  if (!(await waitUntilGone(pid, 10_000))) process.kill(pid, "SIGKILL");
  await waitUntilGone(pid, 5_000);
}
