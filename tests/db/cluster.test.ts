import { type ChildProcess, execFileSync, spawn } from "node:child_process";
import {
  chmodSync,
  chownSync,
  cpSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import pg from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { isRoot } from "#server/start/debian.mjs";
import { waitUntilGone } from "#server/start/processes.mjs";

type Started = { port: number; ownerUrl: string; appUrl: string };

/** Who starts the cluster: as root the machine's other kind of user is tried too, as any other user only that one. */
const starters = isRoot() ? ["root", "nobody"] : ["this user"];

describe.each(starters)("the durable cluster, started by %s", (starter) => {
  const serverUser = starter === "root" ? "postgres" : starter;
  let base: string;
  let folder: string;
  let started: Started;

  /** Runs a program as a user, by runuser when it is another one than this. */
  const asUser = (user: string, command: [string, ...string[]]): [string, string[]] =>
    ["root", "this user"].includes(user) ? [command[0], command.slice(1)] : ["runuser", ["-u", user, "--", ...command]];

  function cluster(action: "start" | "stop"): Started {
    const script = join(base, "tests", "support", "durable-cluster.mjs");
    const [program, args] = asUser(starter, [process.execPath, script, action, folder]);
    return JSON.parse(execFileSync(program, args, { cwd: "/", encoding: "utf8" }));
  }

  async function query(url: string, text: string): Promise<Record<string, unknown>[]> {
    const client = new pg.Client({ connectionString: url });
    await client.connect();
    try {
      return (await client.query(text)).rows;
    } finally {
      await client.end();
    }
  }

  const pidFile = () => join(folder, "pgdata", "postmaster.pid");
  const serverPid = () => Number(readFileSync(pidFile(), "utf8").split("\n")[0]);
  async function killServer(): Promise<void> {
    const pid = serverPid();
    process.kill(pid, "SIGKILL");
    expect(await waitUntilGone(pid, 10_000)).toBe(true);
  }

  beforeAll(() => {
    // A copy that every user can read; the checkout itself may lie in a closed folder.
    base = mkdtempSync(join(tmpdir(), "durable-cluster-"));
    chmodSync(base, 0o755);
    cpSync("server/start", join(base, "server", "start"), { recursive: true });
    mkdirSync(join(base, "tests", "support"), { recursive: true });
    cpSync("tests/support/durable-cluster.mjs", join(base, "tests", "support", "durable-cluster.mjs"));
    folder = join(base, "home", "data");
    mkdirSync(join(base, "home"));
    if (starter === "nobody") {
      const [uid = 0, gid = 0] = ["-u", "-g"].map((flag) =>
        Number(execFileSync("id", [flag, starter], { encoding: "utf8" })),
      );
      chownSync(join(base, "home"), uid, gid);
    }
    started = cluster("start");
  });

  afterAll(() => {
    cluster("stop");
    rmSync(base, { recursive: true });
  });

  it("writes to disk for sure and takes connections from this machine only, over TCP only", async () => {
    const settings = await query(
      started.ownerUrl,
      "select name, setting from pg_settings where name in ('fsync', 'full_page_writes', 'synchronous_commit', 'data_checksums', 'listen_addresses') order by name",
    );
    expect(Object.fromEntries(settings.map(({ name, setting }) => [name, setting]))).toEqual({
      data_checksums: "on",
      fsync: "on",
      full_page_writes: "on",
      listen_addresses: "127.0.0.1",
      synchronous_commit: "on",
    });
    // Linux lists listening sockets (state 0A) with address and port in hexadecimal, the address in host order (proc(5)).
    const port = started.port.toString(16).toUpperCase().padStart(4, "0");
    const listening = ["/proc/net/tcp", "/proc/net/tcp6"]
      .flatMap((file) => readFileSync(file, "utf8").split("\n"))
      .map((line) => line.trim().split(/\s+/))
      .filter(([, local, , state]) => state === "0A" && local?.endsWith(`:${port}`))
      .map(([, local]) => local);
    expect(listening).toEqual([`0100007F:${port}`]);
    expect(readFileSync("/proc/net/unix", "utf8")).not.toContain(`.s.PGSQL.${started.port}`);
  });

  it("keeps its passwords and data from others", () => {
    expect(statSync(join(folder, "secrets.json")).mode & 0o777).toBe(0o600);
    expect(statSync(join(folder, "pgdata")).mode & 0o777).toBe(0o700);
    // No list permission for others: what is in the folder is not theirs to know.
    expect(statSync(folder).mode & 0o044).toBe(0);
  });

  it("lets nobody in without the right password", async () => {
    const wrong = new URL(started.appUrl);
    wrong.password = "0".repeat(64);
    await expect(query(wrong.href, "select 1")).rejects.toThrow("password authentication failed");
    wrong.username = "postgres";
    await expect(query(wrong.href, "select 1")).rejects.toThrow("password authentication failed");
  });

  it("gives the owner the database and neither role more than that", async () => {
    const roles = await query(
      started.ownerUrl,
      "select rolname, rolsuper, rolcreatedb, rolcreaterole, rolbypassrls from pg_roles where rolname like 'standproud%' order by rolname",
    );
    const plain = { rolsuper: false, rolcreatedb: false, rolcreaterole: false, rolbypassrls: false };
    expect(roles).toEqual([
      { rolname: "standproud_app", ...plain },
      { rolname: "standproud_owner", ...plain },
    ]);
    await query(started.appUrl, "create temporary table short_lived (id int)");
    await expect(query(started.appUrl, "create table mine (id int)")).rejects.toThrow(
      "permission denied for schema public",
    );
  });

  it("has every acknowledged row after its server was killed, on the same port with the same passwords", async () => {
    await query(started.ownerUrl, "create table kept as select 4711 as figure");
    await killServer();
    await expect(query(started.ownerUrl, "select 1")).rejects.toThrow("ECONNREFUSED");
    expect(cluster("start")).toEqual(started);
    expect(await query(started.ownerUrl, "select figure from kept")).toEqual([{ figure: 4711 }]);
  });

  it("starts although another program of the same user has got the number of the killed server", async () => {
    await killServer();
    const [program, args] = asUser(serverUser, ["sleep", "60"]);
    const other: ChildProcess = spawn(program, args, { cwd: "/", stdio: "ignore" });
    try {
      const [, ...rest] = readFileSync(pidFile(), "utf8").split("\n");
      writeFileSync(pidFile(), [await sleepPid(other), ...rest].join("\n"));
      expect(cluster("start")).toEqual(started);
      expect(await query(started.ownerUrl, "select 1 as one")).toEqual([{ one: 1 }]);
    } finally {
      other.kill("SIGTERM");
    }
  });

  it("takes over a server that an earlier start left running", async () => {
    const before = serverPid();
    expect(cluster("start")).toEqual(started);
    expect(serverPid()).not.toBe(before);
    expect(await query(started.ownerUrl, "select 1 as one")).toEqual([{ one: 1 }]);
  });
});

/** The id of `sleep` itself: runuser stays in between as its parent. */
async function sleepPid(started: ChildProcess): Promise<number> {
  const parent = started.pid ?? 0;
  for (let attempt = 0; attempt < 100; attempt += 1) {
    const children = readFileSync(`/proc/${parent}/task/${parent}/children`, "utf8").trim();
    if (children !== "") return Number(children.split(" ")[0]);
    if (readFileSync(`/proc/${parent}/comm`, "utf8").trim() === "sleep") return parent;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
  throw new Error("sleep did not start.");
}
