import { spawn } from "node:child_process";
import { readFileSync } from "node:fs";
import { setTimeout as pause } from "node:timers/promises";
import { errorCode } from "./problem.mjs";

const interruptPatienceMs = 5_000;

/** @type {Set<import("node:child_process").ChildProcess>} */
const interruptible = new Set();

/**
 * Asks every program that run() is waiting for to end, and kills after five seconds what did not: npm, for one, goes
 * on for minutes on a slow disk. Each run() then resolves with its code. Programs that run apart finish their work.
 */
export function interruptRunning() {
  const children = [...interruptible];
  for (const child of children) child.kill("SIGTERM");
  const late = () => children.filter((child) => interruptible.has(child)).map((child) => child.kill("SIGKILL"));
  setTimeout(late, interruptPatienceMs).unref();
}

/**
 * @typedef {object} RunOptions
 * @property {string} [cwd]
 * @property {NodeJS.ProcessEnv} [env] the whole environment of the program, not an addition
 * @property {string} [input] what it reads from its standard input
 * @property {boolean} [shown] true: its output goes to this terminal instead of being collected
 * @property {boolean} [apart] true: in a session of its own, so that Ctrl-C in this terminal does not reach it
 *
 * @typedef {object} RunResult
 * @property {number} code its exit code; 128 when a signal ended it, 127 when it could not be started
 * @property {string} output what it wrote to standard output and standard error, in order; empty when `shown`
 */

/**
 * Runs a program to its end. It never throws for what the program did: the code says it.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {RunOptions} [options]
 * @returns {Promise<RunResult>}
 */
export function run(command, args, { cwd, env = process.env, input, shown = false, apart = false } = {}) {
  return new Promise((resolve) => {
    const output = shown ? "inherit" : "pipe";
    const stdin = input === undefined ? "ignore" : "pipe";
    const child = spawn(command, args, { cwd, env, detached: apart, stdio: [stdin, output, output] });
    if (!apart) interruptible.add(child);
    /** @type {Buffer[]} */
    const written = [];
    child.stdout?.on("data", (chunk) => written.push(chunk));
    child.stderr?.on("data", (chunk) => written.push(chunk));
    child.on("error", (error) => resolve({ code: 127, output: `${command}: ${error.message}\n` }));
    child.on("close", (code) => {
      interruptible.delete(child);
      resolve({ code: code ?? 128, output: Buffer.concat(written).toString("utf8") });
    });
    // A program that ends without reading its input closes the pipe; its exit code tells that story.
    child.stdin?.on("error", () => undefined);
    child.stdin?.end(input);
  });
}

/**
 * Whether a process with this id exists, whoever owns it.
 * @param {number} pid
 */
export function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return errorCode(error) === "EPERM";
  }
}

/**
 * The command line of a process as one string with spaces, or "" when it is gone or the system keeps no /proc.
 * Ids are used again after a restart, so an id from a file counts only together with what it runs.
 * @param {number} pid
 */
export function commandLine(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, "utf8").replaceAll("\0", " ").trim();
  } catch {
    return "";
  }
}

/**
 * Waits until a process is gone.
 * @param {number} pid
 * @param {number} limitMs
 * @returns {Promise<boolean>} false when it still lives after `limitMs`
 */
export async function waitUntilGone(pid, limitMs) {
  const end = performance.now() + limitMs;
  while (isAlive(pid)) {
    if (performance.now() > end) return false;
    await pause(50);
  }
  return true;
}
