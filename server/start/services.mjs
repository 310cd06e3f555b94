import { spawn } from "node:child_process";
import { join } from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { Problem } from "./problem.mjs";

/**
 * @typedef {object} Service
 * @property {string} name for the log
 * @property {string} script what its command line holds; tells it from another program with the same process id
 * @property {number} pid
 * @property {Promise<number>} ended its exit code; 128 when a signal ended it
 * @property {() => Promise<void>} stop asks it to end and waits; after ten seconds it is killed
 */

/**
 * Starts a long-running Node program in a session of its own: Ctrl-C in the terminal reaches only the start script,
 * which then stops its services in order.
 * @param {{ name: string, root: string, script: string, args?: readonly string[], nodeArgs?: readonly string[], env: NodeJS.ProcessEnv }} options
 * @returns {Service}
 */
export function startService({ name, root, script, args = [], nodeArgs = [], env }) {
  const child = spawn(process.execPath, [...nodeArgs, script, ...args], {
    cwd: root,
    env,
    detached: true,
    stdio: ["ignore", "inherit", "inherit"],
  });
  if (child.pid === undefined) throw new Problem(`The ${name} could not be started.`);
  const pid = child.pid;
  /** @type {Promise<number>} */
  const ended = new Promise((resolve) => child.on("exit", (code) => resolve(code ?? 128)));
  return {
    name,
    pid,
    script,
    ended,
    stop: async () => {
      if (child.exitCode !== null || child.signalCode !== null) return;
      child.kill("SIGTERM");
      const patience = new AbortController();
      const late = pause(10_000, undefined, { signal: patience.signal }).then(
        () => process.kill(-pid, "SIGKILL"),
        () => undefined,
      );
      await ended;
      patience.abort();
      await late;
    },
  };
}

/**
 * The production server, from the bundle.
 * @param {string} root
 * @param {NodeJS.ProcessEnv} env
 * @returns {Service[]}
 */
export function startProduction(root, env) {
  return [
    startService({
      name: "application",
      root,
      env,
      nodeArgs: ["--enable-source-maps"],
      script: "dist/server/index.mjs",
    }),
  ];
}

/**
 * The server from its sources, started again when they change, on a port of its own; before it Vite's server, which
 * people talk to and which passes requests for data on.
 * @param {string} root
 * @param {NodeJS.ProcessEnv} env
 * @param {{ port: number, host: string, appPort: number }} options
 * @returns {Service[]}
 */
export function startDevelopment(root, env, { port, host, appPort }) {
  const tsx = join("node_modules", "tsx", "dist", "cli.mjs");
  const vite = join("node_modules", "vite", "bin", "vite.js");
  const appEnv = { ...env, PORT: String(appPort), HOST: "127.0.0.1" };
  const viteEnv = { ...env, STANDPROUD_APP: `http://127.0.0.1:${appPort}` };
  return [
    startService({
      name: "application",
      root,
      env: appEnv,
      script: tsx,
      args: ["watch", "--clear-screen=false", "server/index.ts"],
    }),
    startService({
      name: "Vite server",
      root,
      env: viteEnv,
      script: vite,
      args: ["--host", host, "--port", String(port), "--strictPort", "--clearScreen", "false"],
    }),
  ];
}

/**
 * Waits until the application says that it can serve.
 * @param {string} url of its readiness check
 * @param {number} limitMs
 * @param {AbortSignal} signal ends the waiting early
 * @returns {Promise<boolean>} false when the limit passed or the signal came first
 */
export async function waitUntilReady(url, limitMs, signal) {
  const end = performance.now() + limitMs;
  while (performance.now() < end && !signal.aborted) {
    const isReady = await fetch(url, { signal: AbortSignal.timeout(2_000) }).then(
      (response) => response.ok,
      () => false,
    );
    if (isReady) return true;
    await pause(100);
  }
  return false;
}
