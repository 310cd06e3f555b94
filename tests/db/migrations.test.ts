import pg from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { connect } from "#server/db/connection.ts";
import { migrate, migrator } from "#server/db/migrate.ts";
import { migrations } from "#server/db/migrations/list.ts";
import { appRole } from "#server/start/roles.mjs";
import { createTestDatabase, type TestDatabase } from "../support/database.ts";

let database: TestDatabase;
let owner: pg.Client;
beforeAll(async () => {
  database = await createTestDatabase();
  owner = new pg.Client({ connectionString: database.ownerUrl });
  await owner.connect();
});
afterAll(async () => {
  await owner.end();
  await database.drop();
});

/** Every table, column, constraint, index, trigger and function of ours as text. */
async function schema(): Promise<string[]> {
  const { rows } = await owner.query<{ line: string }>(`
    select concat_ws(' ', 'column', table_name, column_name, data_type, is_nullable, column_default) as line
      from information_schema.columns where table_schema = 'public'
    union all select concat_ws(' ', 'constraint', conrelid::regclass, conname, pg_get_constraintdef(oid))
      from pg_constraint where connamespace = 'public'::regnamespace
    union all select concat_ws(' ', 'index', indexdef) from pg_indexes where schemaname = 'public'
    union all select concat_ws(' ', 'trigger', pg_get_triggerdef(oid)) from pg_trigger where not tgisinternal
    union all select concat_ws(' ', 'function', pg_get_functiondef(oid)) from pg_proc where pronamespace = 'public'::regnamespace
    order by line`);
  return rows.map(({ line }) => line).filter((line) => !/ migrations[ (_]/.test(line));
}

describe("migrations", () => {
  it("go up, all the way down and up again to the same schema", async () => {
    const before = await schema();
    expect(before.some((line) => line.startsWith("trigger") && line.includes("revisions_guarded"))).toBe(true);
    const sequelize = connect(database.ownerUrl, { poolMax: 1 });
    try {
      const umzug = migrator(sequelize);
      expect((await umzug.executed()).map(({ name }) => name)).toEqual(migrations.map(({ name }) => name));
      await umzug.down({ to: 0 });
      // The queue's own triggers are not ours to take down.
      expect((await schema()).filter((line) => !line.includes("graphile_worker"))).toEqual([]);
    } finally {
      await sequelize.close();
    }
    await migrate({ ownerUrl: database.ownerUrl, appRole });
    expect(await schema()).toEqual(before);
  });

  it("change nothing when there is nothing to do", async () => {
    const before = await schema();
    await migrate({ ownerUrl: database.ownerUrl, appRole });
    expect(await schema()).toEqual(before);
  });

  it("are run once when two processes start at the same moment", async () => {
    const empty = await createTestDatabase();
    const both = [connect(empty.ownerUrl, { poolMax: 1 }), connect(empty.ownerUrl, { poolMax: 1 })] as const;
    try {
      await migrator(both[0]).down({ to: 0 });
      await Promise.all(both.map((sequelize) => migrator(sequelize).up()));
      expect((await migrator(both[1]).executed()).map(({ name }) => name)).toEqual(migrations.map(({ name }) => name));
    } finally {
      await Promise.all(both.map((sequelize) => sequelize.close()));
      await empty.drop();
    }
  });

  it("leave nothing of a step that fails half way", async () => {
    const sequelize = connect(database.ownerUrl, { poolMax: 1 });
    try {
      const failing = {
        name: "2099-01-01-01-failing",
        up: async (sql: (text: string) => Promise<void>) => {
          await sql("create table half_done (id integer)");
          await sql("create table half_done (id integer)");
        },
        down: async () => undefined,
      };
      await expect(migrator(sequelize, [...migrations, failing]).up()).rejects.toThrow("half_done");
      const { rows } = await owner.query("select to_regclass('half_done') as found");
      expect(rows[0]?.found).toBeNull();
      expect((await migrator(sequelize).pending()).length).toBe(0);
    } finally {
      await sequelize.close();
    }
  });

  it("refuse a role name that is not a plain one", async () => {
    const hostile = 'app"; drop table people; --';
    await expect(migrate({ ownerUrl: database.ownerUrl, appRole: hostile })).rejects.toThrow("Not a role name");
  });
});
