import { chownSync, existsSync, readFileSync, readlinkSync, realpathSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { isRoot } from "./debian.mjs";
import { Problem } from "./problem.mjs";
import { isAlive, run } from "./processes.mjs";

/** The superuser of every cluster made here, and the system's user the server runs as when root starts it. */
export const superuser = "postgres";

/**
 * @typedef {object} Cluster
 * @property {import("./postgres-programs.mjs").PostgresPrograms} programs
 * @property {string} data the cluster's own folder, PostgreSQL's "data directory"
 */

/**
 * Runs a program as the user the server runs as: PostgreSQL refuses root, so root steps aside to `postgres`.
 * The working folder is "/", since that user can't enter a checkout in root's home.
 * @param {string} program
 * @param {readonly string[]} args
 */
export function runAsServerUser(program, args) {
  const [command, ...rest] = isRoot() ? ["runuser", "-u", superuser, "--", program, ...args] : [program, ...args];
  return run(command ?? program, rest, {
    cwd: "/",
    env: { PATH: process.env.PATH, HOME: "/", LC_ALL: "C.UTF-8" },
    apart: true,
  });
}

/**
 * Hands a file or folder to the user the server runs as; as another user than root it is theirs already.
 * @param {string} path
 * @throws {Problem} when there is no such user
 */
export async function giveToServerUser(path) {
  if (!isRoot()) return;
  const ids = await Promise.all([run("id", ["-u", superuser]), run("id", ["-g", superuser])]);
  if (ids.some(({ code }) => code !== 0)) {
    throw new Problem(
      `PostgreSQL does not run as root, and this system has no user "${superuser}" to run it as. Start Standproud as another user, or set DATABASE_URL.`,
    );
  }
  const [uid = 0, gid = 0] = ids.map(({ output }) => Number(output));
  chownSync(path, uid, gid);
}

/**
 * Makes an empty cluster in an existing empty folder: with password sign-in when durable; one that is thrown away
 * trusts everybody on this machine, since it holds nothing.
 * @param {Cluster} cluster
 * @param {{ passwordFile: string, password: string, durable: boolean }} options `passwordFile` is written for initdb and removed again
 * @throws {Problem} with initdb's words
 */
export async function initCluster({ programs, data }, { passwordFile, password, durable }) {
  writeFileSync(passwordFile, `${password}\n`, { mode: 0o600 });
  try {
    await giveToServerUser(passwordFile);
    const { code, output } = await runAsServerUser(join(programs.folder, "initdb"), [
      `--pgdata=${data}`,
      `--username=${superuser}`,
      `--pwfile=${passwordFile}`,
      `--auth=${durable ? "scram-sha-256" : "trust"}`,
      "--encoding=UTF8",
      "--locale=C.UTF-8",
      durable ? "--data-checksums" : "--no-sync",
    ]);
    if (code !== 0) throw new Problem(`initdb could not make the database cluster in ${data}:\n${output}`);
  } finally {
    rmSync(passwordFile, { force: true });
  }
}

/**
 * Starts the server of a cluster on loopback and waits until it answers. It goes on when this process ends.
 * @param {Cluster} cluster
 * @param {{ port: number, durable: boolean }} options
 * @throws {Problem} with the end of the server's own log
 */
export async function startServer({ programs, data }, { port, durable }) {
  const log = join(data, "server.log");
  const settings = [
    "listen_addresses=127.0.0.1",
    `port=${port}`,
    "unix_socket_directories=",
    "password_encryption=scram-sha-256",
    "timezone=UTC",
    `fsync=${durable ? "on" : "off"}`,
    ...(durable ? [] : ["synchronous_commit=off", "full_page_writes=off", "max_connections=200"]),
  ];
  const options = settings.map((setting) => `-c ${setting}`).join(" ");
  // After a kill -9 the server's helpers need a moment to notice and let go of the shared memory.
  for (let attempt = 1; ; attempt += 1) {
    const result = await runAsServerUser(join(programs.folder, "pg_ctl"), [
      "-D",
      data,
      "-l",
      log,
      "-o",
      options,
      "-w",
      "-t",
      "120",
      "start",
    ]);
    if (result.code === 0) return;
    const words = existsSync(log) ? readFileSync(log, "utf8").trim().split("\n").slice(-8).join("\n") : result.output;
    if (attempt >= 20 || !words.includes("shared memory block")) {
      throw new Problem(`The database server did not start. The end of ${log}:\n${words}`);
    }
    await pause(250);
  }
}

/**
 * Stops the server: open sessions are ended, everything acknowledged is on disk.
 * @param {Cluster} cluster
 * @param {{ mode?: "fast" | "immediate" }} [options] `immediate` only for a cluster that is thrown away
 * @returns {Promise<boolean>} false when it still runs, or ran no more
 */
export async function stopServer({ programs, data }, { mode = "fast" } = {}) {
  const { code } = await runAsServerUser(join(programs.folder, "pg_ctl"), [
    "-D",
    data,
    "-m",
    mode,
    "-w",
    "-t",
    "60",
    "stop",
  ]);
  return code === 0;
}

/**
 * The process that serves a cluster, or undefined when none does. A postmaster.pid that a kill -9 or a power cut left
 * behind may name a process that is something else by now, so the process must also stand in the cluster's folder.
 * @param {string} data
 * @returns {number | undefined}
 */
export function serverPid(data) {
  const file = join(data, "postmaster.pid");
  if (!existsSync(file)) return undefined;
  const pid = Number(readFileSync(file, "utf8").split("\n")[0]);
  return Number.isInteger(pid) && pid > 0 && isAlive(pid) && standsIn(pid, data) ? pid : undefined;
}

/**
 * @param {number} pid
 * @param {string} folder
 */
function standsIn(pid, folder) {
  if (!existsSync("/proc/self/cwd")) return true;
  try {
    return readlinkSync(`/proc/${pid}/cwd`) === realpathSync(folder);
  } catch {
    return false;
  }
}

/**
 * Runs SQL as the superuser, with psql, since this must work before any package is installed.
 * @param {Cluster} cluster
 * @param {{ port: number, password: string, sql: string, database?: string }} options
 * @returns {Promise<string>} psql's output, unaligned
 * @throws {Problem} with psql's words
 */
export async function runSql({ programs }, { port, password, sql, database = "postgres" }) {
  const { code, output } = await run(
    join(programs.folder, "psql"),
    [
      "-X",
      "-q",
      "-A",
      "-t",
      "-v",
      "ON_ERROR_STOP=1",
      "-h",
      "127.0.0.1",
      "-p",
      String(port),
      "-U",
      superuser,
      "-d",
      database,
    ],
    {
      cwd: "/",
      // Statements that set a password must not reach the server's log when they fail.
      env: {
        PATH: process.env.PATH,
        PGPASSWORD: password,
        PGOPTIONS: "-c log_min_error_statement=panic",
        PGCONNECT_TIMEOUT: "10",
      },
      input: sql,
    },
  );
  if (code !== 0) throw new Problem(`The database could not be prepared:\n${output}`);
  return output;
}
