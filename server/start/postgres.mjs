import { existsSync, mkdirSync, readFileSync, renameSync, rmSync } from "node:fs";
import { join } from "node:path";
import {
  giveToServerUser,
  initCluster,
  runAsServerUser,
  runSql,
  serverPid,
  startServer,
  stopServer,
} from "./cluster.mjs";
import { makeDataFolder, readOrMakeSecrets, syncFolder, writeDurably } from "./data-folder.mjs";
import { isRoot } from "./debian.mjs";
import { findFreePort, parsePort } from "./ports.mjs";
import { ensurePostgresPrograms } from "./postgres-programs.mjs";
import { Problem } from "./problem.mjs";
import { appRole, databaseSql, databaseUrl, ownerRole, rolesSql } from "./roles.mjs";

/**
 * @typedef {object} RunningCluster
 * @property {string} data the cluster's folder
 * @property {number} port on 127.0.0.1
 * @property {string} ownerUrl for DATABASE_URL
 * @property {string} appUrl for APP_DATABASE_URL
 * @property {() => boolean} isRunning
 * @property {() => Promise<boolean>} stop resolves to false when the server had ended by itself
 */

/**
 * Starts the checkout's own durable cluster, making it first when it is missing: fsync on, passwords, loopback only,
 * no socket file, the port remembered. A server that an earlier start left behind is stopped and started afresh.
 * Nobody else may be starting the same folder at the same time.
 * @param {string} folder the data folder; see dataFolder()
 * @returns {Promise<RunningCluster>}
 * @throws {Problem} when it can't be made or started, with the reason
 */
export async function startDurableCluster(folder) {
  makeDataFolder(folder);
  const secrets = readOrMakeSecrets(folder);
  const data = join(folder, "pgdata");
  const cluster = { data, programs: await ensurePostgresPrograms(clusterMajor(data)) };
  if (!existsSync(data)) await makeCluster(folder, cluster, secrets.superuser);

  if (serverPid(data) !== undefined) await stopServer(cluster);
  // Whatever postmaster.pid is still there is stale; PostgreSQL itself would refuse if another program got its number.
  if (serverPid(data) === undefined) rmSync(join(data, "postmaster.pid"), { force: true });

  const port = await rememberedPort(folder);
  try {
    await startServer(cluster, { port, durable: true });
    await runSql(cluster, { port, password: secrets.superuser, sql: `${rolesSql(secrets)}\n${databaseSql}` });
  } catch (error) {
    if (serverPid(data) !== undefined) await stopServer(cluster);
    throw error;
  }
  return {
    data,
    port,
    ownerUrl: databaseUrl({ role: ownerRole, password: secrets.owner, port }),
    appUrl: databaseUrl({ role: appRole, password: secrets.app, port }),
    isRunning: () => serverPid(data) !== undefined,
    stop: () => stopServer(cluster),
  };
}

/**
 * The version that wrote a cluster, or undefined when there is none yet.
 * @param {string} data
 */
function clusterMajor(data) {
  const file = join(data, "PG_VERSION");
  return existsSync(file) ? Number.parseInt(readFileSync(file, "utf8"), 10) : undefined;
}

/**
 * Makes the cluster under another name and renames it when it is whole, so that an interrupted first start leaves
 * nothing that looks like a database.
 * @param {string} folder
 * @param {import("./cluster.mjs").Cluster} cluster
 * @param {string} password
 */
async function makeCluster(folder, cluster, password) {
  const unfinished = join(folder, "pgdata.new");
  rmSync(unfinished, { recursive: true, force: true });
  mkdirSync(unfinished, { mode: 0o700 });
  await giveToServerUser(unfinished);
  if (isRoot() && (await runAsServerUser("test", ["-x", unfinished])).code !== 0) {
    rmSync(unfinished, { recursive: true });
    throw new Problem(
      `The user postgres can't reach ${folder}: a folder above it is closed to others. Set STANDPROUD_DATA to a folder under /var/lib or /srv.`,
    );
  }
  await initCluster(
    { ...cluster, data: unfinished },
    { passwordFile: join(folder, "initdb-password"), password, durable: true },
  );
  renameSync(unfinished, cluster.data);
  syncFolder(folder);
}

/**
 * The port this cluster had last time, or a new one when another program has taken that.
 * @param {string} folder
 */
async function rememberedPort(folder) {
  const file = join(folder, "port");
  const before = existsSync(file) ? parsePort(readFileSync(file, "utf8")) : undefined;
  const port = await findFreePort(before);
  if (port !== before) writeDurably(file, `${port}\n`);
  return port;
}
