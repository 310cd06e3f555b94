import { type ChildProcess, spawn } from "node:child_process";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import pg from "pg";
import { afterAll, beforeAll, expect, it } from "vitest";
import { createTestDatabase, type TestDatabase } from "../support/database.ts";

let database: TestDatabase;
let owner: pg.Client;
let folder: string;
beforeAll(async () => {
  database = await createTestDatabase();
  folder = await mkdtemp(join(tmpdir(), "standproud-worker-"));
  owner = new pg.Client({ connectionString: database.ownerUrl });
  await owner.connect();
});
afterAll(async () => {
  for (const child of started) if (child.exitCode === null && child.signalCode === null) child.kill("SIGKILL");
  await owner.end();
  await database.drop();
  await rm(folder, { recursive: true });
});

/** The worker program, from its source, in a process of its own. */
const started: ChildProcess[] = [];
function startWorker() {
  const child = spawn(process.execPath, ["--import", "tsx", "server/worker.ts"], {
    env: {
      ...process.env,
      NODE_ENV: "test",
      PUBLIC_URL: "http://127.0.0.1:4600",
      DATABASE_URL: database.ownerUrl,
      APP_DATABASE_URL: database.appUrl,
      AUTH_SECRET: "a secret for tests, of no worth to anybody",
      FILES_DIR: join(folder, "files"),
      MAIL_SINK_DIR: join(folder, "mail"),
    },
    stdio: ["ignore", "pipe", "inherit"],
  });
  started.push(child);
  let output = "";
  child.stdout.on("data", (chunk) => {
    output += chunk;
  });
  const ended = new Promise<number | null>((resolve) => child.on("exit", resolve));
  return { child, ended, output: () => output };
}

async function until(what: string, isSo: () => Promise<boolean> | boolean): Promise<void> {
  for (let round = 0; round < 400; round += 1) {
    if (await isSo()) return;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error(`Waited in vain until ${what}.`);
}

const count = async (sql: string): Promise<number> => (await owner.query<{ n: number }>(sql)).rows[0]?.n ?? 0;

it("a job that a killed worker held is done by the next one; a living worker keeps its own", async () => {
  const id = "11111111-1111-4111-8111-111111111111";
  await owner.query(
    "insert into outgoing_mails (id, kind, address, data, created_at) values ($1, 'new password', 'a@b.example', '{}', now())",
    [id],
  );
  // Whoever sends the mail waits for this lock, so it is caught in the middle of its job.
  await owner.query("begin");
  await owner.query("select 1 from outgoing_mails where id = $1 for update", [id]);
  const helper = new pg.Client({ connectionString: database.ownerUrl });
  await helper.connect();
  try {
    await helper.query("select graphile_worker.add_job('send-mail', json_build_object('mailId', $1::text))", [id]);
    const held = "select count(*)::int as n from graphile_worker.jobs where locked_by is not null";
    const first = startWorker();
    await until("the first worker holds the job", async () => (await count(held)) === 1);
    const holder = (await owner.query("select locked_by from graphile_worker.jobs")).rows[0]?.locked_by;

    // A second worker looks for the dead while the first lives, and leaves its job alone.
    await new Promise((resolve) => setTimeout(resolve, 2_500));
    const second = startWorker();
    await until("the second worker works", () => second.output().includes("Working on the queue"));
    expect((await owner.query("select locked_by from graphile_worker.jobs")).rows).toEqual([{ locked_by: holder }]);
    expect(second.output()).not.toContain("Took back jobs");

    first.child.kill("SIGKILL");
    await first.ended;
    await owner.query("commit");
    await until(
      "the mail is settled",
      async () => (await count("select count(*)::int as n from outgoing_mails where state = 'dropped'")) === 1,
    );
    await until(
      "the queue is empty",
      async () => (await count("select count(*)::int as n from graphile_worker.jobs")) === 0,
    );
    expect(second.output()).toContain("Took back jobs from a worker that is gone");

    second.child.kill("SIGTERM");
    expect(await second.ended).toBe(0);
    expect(second.output()).toContain('"msg":"Stopped"');
  } finally {
    await helper.end();
  }
});
