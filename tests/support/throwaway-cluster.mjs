import { mkdtempSync, readdirSync, realpathSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import {
  giveToServerUser,
  initCluster,
  runSql,
  serverPid,
  startServer,
  stopServer,
  superuser,
} from "../../server/start/cluster.mjs";
import { findFreePort } from "../../server/start/ports.mjs";
import { ensurePostgresPrograms } from "../../server/start/postgres-programs.mjs";
import { isAlive } from "../../server/start/processes.mjs";
import { databaseUrl, rolesSql } from "../../server/start/roles.mjs";

const prefix = "standproud-test-";

/**
 * Starts an empty cluster in the temp folder: fsync off, everybody on loopback trusted, both roles there. Nothing in
 * it outlives stop(), and what a killed run left behind is cleared away first.
 * @returns {Promise<{ url: string, port: number, stop: () => Promise<void> }>} `url` is the superuser's
 */
export async function startThrowawayCluster() {
  const programs = await ensurePostgresPrograms();
  await clearLeftovers(programs);
  // The maker's process id is in the name; clearLeftovers() tells by it whether a folder is in use.
  const data = mkdtempSync(join(realpathSync(tmpdir()), `${prefix}${process.pid}-`));
  const cluster = { programs, data };
  const stop = async () => {
    if (serverPid(data) !== undefined) await stopServer(cluster, { mode: "immediate" });
    rmSync(data, { recursive: true, force: true });
  };
  try {
    await giveToServerUser(data);
    await initCluster(cluster, { passwordFile: `${data}-password`, password: superuser, durable: false });
    const port = await findFreePort();
    await startServer(cluster, { port, durable: false });
    await runSql(cluster, { port, password: superuser, sql: rolesSql({ owner: "0a", app: "0b" }) });
    return { url: databaseUrl({ role: superuser, port, database: "postgres" }), port, stop };
  } catch (error) {
    await stop();
    throw error;
  }
}

/** @param {import("../../server/start/postgres-programs.mjs").PostgresPrograms} programs */
async function clearLeftovers(programs) {
  const folder = realpathSync(tmpdir());
  for (const name of readdirSync(folder).filter((entry) => entry.startsWith(prefix))) {
    const maker = Number(name.slice(prefix.length).split("-")[0]);
    if (!Number.isInteger(maker) || isAlive(maker)) continue;
    const data = join(folder, name);
    if (serverPid(data) !== undefined) await stopServer({ programs, data }, { mode: "immediate" });
    rmSync(data, { recursive: true, force: true });
  }
}
