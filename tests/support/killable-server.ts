import { type ChildProcess, spawn } from "node:child_process";
import { cp, mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { checkoutOf } from "#server/start/data-folder.mjs";
import { findFreePort } from "#server/start/ports.mjs";
import { waitUntilReady } from "#server/start/services.mjs";
import { createTestDatabase, type TestDatabase } from "./database.ts";

export type KillableServer = {
  readonly baseUrl: string;
  readonly database: TestDatabase;
  readonly filesDir: string;
  /** Where the mails lie that nobody sends in a test. */
  readonly mailDir: string;
  /** Starts the built server and waits until it says that it is ready. */
  readonly start: () => Promise<void>;
  /** kill -9: nothing of the process is asked, nothing is finished. */
  readonly kill: () => Promise<void>;
  /** Everything the server printed, over all its lives. */
  readonly printed: () => string;
  /** Kills it and clears away everything that is its own. */
  readonly clear: () => Promise<void>;
};

/**
 * The server as it is deployed: the bundle, in a process of its own, as the role that owns no table. With `beside` it is one more
 * process over the same database, files and mails as another; that one is cleared last.
 */
export async function prepareServer({ beside }: { beside?: KillableServer } = {}): Promise<KillableServer> {
  const database = beside?.database ?? (await createTestDatabase());
  const folder = await mkdtemp(join(tmpdir(), "standproud-kill-"));
  const root = checkoutOf(import.meta.url);
  // A copy, so that a build beside this test can't pull the bundle away between two starts.
  const bundle = await mkdtemp(join(root, "dist", "under-fire-"));
  await cp(join(root, "dist", "server"), bundle, { recursive: true });
  const port = await findFreePort();
  const baseUrl = `http://127.0.0.1:${port}`;
  const filesDir = beside?.filesDir ?? join(folder, "files");
  const mailDir = beside?.mailDir ?? join(folder, "mail");
  const env = {
    PATH: process.env.PATH,
    NODE_ENV: "production",
    PORT: String(port),
    PUBLIC_URL: baseUrl,
    DATABASE_URL: database.ownerUrl,
    APP_DATABASE_URL: database.appUrl,
    AUTH_SECRET: "a secret for tests, of no worth to anybody",
    FILES_DIR: filesDir,
    MAIL_SINK_DIR: mailDir,
    RATE_LIMIT_FACTOR: "1000",
  };
  let output = "";
  let child: ChildProcess | undefined;

  async function kill(): Promise<void> {
    const running = child;
    child = undefined;
    if (!running || running.exitCode !== null || running.signalCode !== null) return;
    const gone = new Promise((resolve) => running.once("exit", resolve));
    running.kill("SIGKILL");
    await gone;
  }

  return {
    baseUrl,
    database,
    filesDir,
    mailDir,
    kill,
    printed: () => output,
    async start() {
      const started = spawn(process.execPath, ["--enable-source-maps", join(bundle, "index.mjs")], {
        cwd: root,
        env,
        stdio: ["ignore", "pipe", "pipe"],
      });
      child = started;
      for (const stream of [started.stdout, started.stderr]) {
        stream.on("data", (chunk: Buffer) => {
          output += chunk.toString();
        });
      }
      const ended = new AbortController();
      started.once("exit", () => ended.abort());
      const isReady = await waitUntilReady(`${baseUrl}/api/ready`, 60_000, ended.signal);
      if (!isReady) throw new Error(`The server did not start:\n${output.slice(-4_000)}`);
    },
    async clear() {
      await kill();
      if (!beside) await database.drop();
      await rm(folder, { recursive: true, force: true });
      await rm(bundle, { recursive: true, force: true });
    },
  };
}
