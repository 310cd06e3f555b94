import { join } from "node:path";
import { ensureBuild } from "./build.mjs";
import { checkoutOf, dataFolder, makeDataFolder, readOrMakeSecrets } from "./data-folder.mjs";
import { demoSignIns } from "./demo-accounts.mjs";
import { Ended, listenForEnd } from "./ending.mjs";
import { applicationEnv } from "./environment.mjs";
import { say, secondsSince, shownPath } from "./log.mjs";
import { ensurePackages } from "./packages.mjs";
import { findFreePort, isPortFree } from "./ports.mjs";
import { startDurableCluster } from "./postgres.mjs";
import { Problem } from "./problem.mjs";
import { run } from "./processes.mjs";
import { leaveFolder, recordChildren, takeFolder } from "./run-lock.mjs";
import { startDevelopment, startProduction, waitUntilReady } from "./services.mjs";
import { reachableHost, readSettings } from "./settings.mjs";

const clusterCheckMs = 2_000;

/**
 * @typedef {object} Run
 * @property {string} root the checkout
 * @property {string} folder its data folder
 * @property {import("./settings.mjs").Settings} settings
 * @property {import("./ending.mjs").Ending} ending
 * @property {(() => unknown)[]} undo what takes down again, in the order it was brought up
 */

/**
 * Brings everything up in order and returns when somebody asked to stop.
 * @param {Run} current
 * @throws {Problem} when a step fails or a service ends by itself
 */
async function serve({ root, folder, settings, ending, undo }) {
  const startedAt = performance.now();
  makeDataFolder(folder);
  await takeFolder(folder);
  undo.push(() => leaveFolder(folder));
  await refuseTakenPort(settings);

  // Before the packages: whoever must install PostgreSQL by hand learns it at once, not after a minute of npm.
  const cluster = process.env.DATABASE_URL ? undefined : await startDurableCluster(folder);
  if (cluster !== undefined) {
    undo.push(cluster.stop);
    say(
      `Database: ${cluster.data} on 127.0.0.1:${cluster.port}; its passwords are in ${join(folder, "secrets.json")}.`,
    );
  }
  const env = applicationEnv({ settings, folder, secrets: readOrMakeSecrets(folder), cluster, env: process.env });
  if (!env.APP_DATABASE_URL) {
    say("APP_DATABASE_URL is not set: the application runs with the role of DATABASE_URL, which owns the tables.");
  }

  ending.check();
  await ensurePackages(root);
  ending.check();
  if (!settings.isDev) await ensureBuild(root);
  ending.check();
  await migrate(root, env, settings.isDev);
  ending.check();

  const services = settings.isDev
    ? startDevelopment(root, env, { ...settings, appPort: await findFreePort() })
    : startProduction(root, env);
  undo.push(() => Promise.all(services.map((service) => service.stop())));
  recordChildren(
    folder,
    services.map(({ pid, script }) => ({ pid, what: script })),
  );
  const patience = new AbortController();
  undo.push(() => patience.abort());
  const url = `http://${reachableHost(settings.host)}:${settings.port}/api/ready`;
  const ready = waitUntilReady(url, 60_000, patience.signal).then((isReady) => {
    if (patience.signal.aborted) return;
    if (!isReady) throw new Problem(`The application was not ready within a minute (${url}); its log is above.`);
    say(welcome({ root, settings, env, seconds: secondsSince(startedAt) }));
  });
  await Promise.race([
    ending.asked,
    // Once ready it has no more to say, but a failure of it ends the run.
    ready.then(() => ending.asked),
    serviceEnd(services),
    clusterEnd(cluster, undo),
  ]);
}

/**
 * @param {import("./settings.mjs").Settings} settings
 * @throws {Problem} when the application could not listen there, before anything slow begins
 */
async function refuseTakenPort({ port, host }) {
  const isFree = await isPortFree(port, host).catch((error) => {
    throw new Problem(
      `Nothing can listen on ${host}, port ${port}: ${error.message}. Choose others with HOST and PORT.`,
    );
  });
  if (!isFree) {
    throw new Problem(`Port ${port} is taken by another program. Stop that one, or choose a port: PORT=4700 npm start`);
  }
}

/**
 * Brings the tables up to date and loads the demo shop into a database without one.
 * @param {string} root
 * @param {NodeJS.ProcessEnv} env
 * @param {boolean} isDev
 */
async function migrate(root, env, isDev) {
  const program = isDev
    ? ["--import", "tsx", "server/migrate.ts"]
    : ["--enable-source-maps", "dist/server/migrate.mjs"];
  const { code } = await run(process.execPath, program, { cwd: root, env, shown: true });
  if (code !== 0) throw new Problem("The database could not be brought up to date; the reason is above.");
}

/**
 * @param {import("./services.mjs").Service[]} services
 * @returns {Promise<never>} rejects when the first of them ends
 */
async function serviceEnd(services) {
  const first = await Promise.race(services.map(({ name, ended }) => ended.then((code) => ({ name, code }))));
  throw new Problem(`The ${first.name} ended by itself (exit code ${first.code}); its log is above.`);
}

/**
 * @param {import("./postgres.mjs").RunningCluster | undefined} cluster
 * @param {Run["undo"]} undo
 * @returns {Promise<never>} rejects when the database server is gone; never settles without one of our own
 */
function clusterEnd(cluster, undo) {
  return new Promise((_, reject) => {
    if (cluster === undefined) return;
    const timer = setInterval(() => {
      if (!cluster.isRunning())
        reject(new Problem(`The database server ended by itself; see ${cluster.data}/server.log.`));
    }, clusterCheckMs);
    undo.push(() => clearInterval(timer));
  });
}

/** @param {{ root: string, settings: import("./settings.mjs").Settings, env: NodeJS.ProcessEnv, seconds: string }} facts */
function welcome({ root, settings, env, seconds }) {
  const signIns = env.DEMO === "off" ? [] : ["Demo sign-ins:", ...demoSignIns()];
  const lines = [
    `Standproud is ready after ${seconds} s: ${settings.publicUrl}`,
    ...signIns,
    `Uploaded files are in ${shownPath(root, settings.filesDir)}. Ctrl-C stops everything.`,
  ];
  return `\n${lines.join("\n")}\n`;
}

/** Runs until the end and sets the exit code: 0 when asked to stop, 130 when asked before all was up, 1 for a problem. */
async function main() {
  const ending = listenForEnd();
  /** @type {Run["undo"]} */
  const undo = [];
  try {
    const root = checkoutOf(import.meta.url);
    const settings = readSettings(root, process.argv.slice(2), process.env);
    await serve({ root, folder: dataFolder(root, process.env), settings, ending, undo });
    say("\nStopping …");
  } catch (error) {
    if (ending.isAsked() || error instanceof Ended) {
      process.exitCode = 130;
    } else {
      say(error instanceof Problem ? `\n${error.message}` : `\n${error instanceof Error ? error.stack : error}`);
      process.exitCode = 1;
    }
  }
  for (const step of undo.reverse()) await step();
  if (ending.isAsked()) say("Stopped.");
}

await main();
