import { type ChildProcess, spawn } from "node:child_process";
import { mkdtemp, rm } from "node:fs/promises";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import pg from "pg";
import { afterAll, beforeAll, expect, it } from "vitest";
import { createTestDatabase, type TestDatabase } from "../support/database.ts";
import { Visitor } from "../support/visitor.ts";

let database: TestDatabase;
let folder: string;
const started: ChildProcess[] = [];
beforeAll(async () => {
  database = await createTestDatabase();
  folder = await mkdtemp(join(tmpdir(), "standproud-ending-"));
});
afterAll(async () => {
  for (const child of started) if (child.exitCode === null && child.signalCode === null) child.kill("SIGKILL");
  await database.drop();
  await rm(folder, { recursive: true });
});

async function freePort(): Promise<number> {
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const address = server.address();
  await new Promise<void>((resolve) => server.close(() => resolve()));
  return typeof address === "object" && address ? address.port : 0;
}

/** The application's own program, from its source. */
async function startProgram(env: Record<string, string> = {}) {
  const port = await freePort();
  const child = spawn(process.execPath, ["--import", "tsx", "server/index.ts"], {
    env: {
      ...process.env,
      NODE_ENV: "production",
      PORT: String(port),
      PUBLIC_URL: `http://127.0.0.1:${port}`,
      DATABASE_URL: database.ownerUrl,
      AUTH_SECRET: "a secret for tests, of no worth to anybody",
      FILES_DIR: join(folder, "files"),
      MAIL_SINK_DIR: join(folder, "mail"),
      ...env,
    },
    stdio: ["ignore", "pipe", "pipe"],
  });
  started.push(child);
  let output = "";
  for (const stream of [child.stdout, child.stderr]) {
    stream.on("data", (chunk) => {
      output += chunk;
    });
  }
  const ended = new Promise<number | null>((resolve) => child.on("exit", resolve));
  return { child, ended, output: () => output, visitor: new Visitor(`http://127.0.0.1:${port}`) };
}

async function until(what: string, isSo: () => boolean | Promise<boolean>): Promise<void> {
  for (let round = 0; round < 400; round += 1) {
    if (await isSo()) return;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error(`Waited in vain until ${what}.`);
}

it("asked to stop, it finishes the request it has, takes no other, and ends well", async () => {
  const program = await startProgram({ APP_DATABASE_URL: database.appUrl });
  await until("it listens", () => program.output().includes('"msg":"Listening"'));
  expect((await program.visitor.send("GET", "/api/ready")).status).toBe(200);
  expect(program.output()).not.toContain("APP_DATABASE_URL is missing");

  const owner = new pg.Client({ connectionString: database.ownerUrl });
  await owner.connect();
  try {
    // Holds the request up in the middle.
    await owner.query("begin; lock table people in access exclusive mode");
    const answer = program.visitor.send("POST", "/api/links/request", { body: { email: "a@b.example" } });
    await until("the request waits for the lock", async () => {
      const { rows } = await owner.query("select count(*)::int as n from pg_locks where not granted");
      return rows[0]?.n > 0;
    });
    program.child.kill("SIGTERM");
    await until("it is stopping", () => program.output().includes('"msg":"Stopping"'));
    await expect(program.visitor.send("GET", "/api/health")).rejects.toThrow();
    await owner.query("commit");
    expect((await answer).status).toBe(202);
    expect(await program.ended).toBe(0);
    expect(program.output()).toContain('"msg":"Stopped"');
  } finally {
    await owner.end();
  }
});

it("says in its log when it runs with the role that owns the tables", async () => {
  const program = await startProgram();
  await until("it listens", () => program.output().includes('"msg":"Listening"'));
  expect(program.output()).toMatch(/"level":40.*APP_DATABASE_URL is missing/);
  program.child.kill("SIGTERM");
  expect(await program.ended).toBe(0);
});

it("does not start with settings that make no sense, and names them", async () => {
  const program = await startProgram({ AUTH_SECRET: "short", TRUST_PROXY: "" });
  expect(await program.ended).toBe(1);
  expect(program.output()).toContain("AUTH_SECRET: at least 32 characters");
});
