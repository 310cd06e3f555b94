import pg from "pg";
import { afterAll, beforeAll, expect, it } from "vitest";
import { createTestDatabase, type TestDatabase } from "../support/database.ts";

let one: TestDatabase;
let other: TestDatabase;

beforeAll(async () => {
  [one, other] = await Promise.all([createTestDatabase(), createTestDatabase({ poolMax: 10 })]);
});
afterAll(async () => {
  await Promise.all([one.drop(), other.drop()]);
});

async function query(url: string, text: string): Promise<Record<string, unknown>[]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query(text)).rows;
  } finally {
    await client.end();
  }
}

it("gives each test file a migrated database of its own", async () => {
  await query(one.ownerUrl, "create table only_here (id int)");
  const tables =
    "select count(*)::int as n from pg_tables where schemaname = 'public' and tablename in ('jobs', 'only_here')";
  expect(await query(one.ownerUrl, tables)).toEqual([{ n: 2 }]);
  expect(await query(other.ownerUrl, tables)).toEqual([{ n: 1 }]);
  expect([one.poolMax, other.poolMax]).toEqual([1, 10]);
});

it("gives the application a role that may work with rows but owns no table", async () => {
  expect(await query(one.appUrl, "select count(*)::int as n from jobs")).toEqual([{ n: 0 }]);
  await expect(query(one.appUrl, "alter table jobs add column extra text")).rejects.toThrow(
    "must be owner of table jobs",
  );
  await expect(query(one.appUrl, "truncate events")).rejects.toThrow("permission denied for table events");
  const owned = "select count(*)::int as n from pg_tables where tableowner = current_user";
  expect(await query(one.appUrl, owned)).toEqual([{ n: 0 }]);
});

it("removes a database although somebody is still connected to it", async () => {
  const short = await createTestDatabase();
  const client = new pg.Client({ connectionString: short.appUrl });
  client.on("error", () => undefined);
  await client.connect();
  await short.drop();
  await expect(query(short.appUrl, "select 1")).rejects.toThrow("does not exist");
});
