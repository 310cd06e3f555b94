import { runMigrations } from "graphile-worker";
import { QueryTypes, type Sequelize } from "sequelize";
import { Umzug } from "umzug";
import { connect } from "./connection.ts";
import type { Migration } from "./migration.ts";
import { migrations } from "./migrations/list.ts";

/**
 * Umzug over our migrations. Each runs in one transaction together with the note that it was run, so that a process
 * killed in the middle leaves either both or nothing; two processes at once take turns.
 */
export function migrator(sequelize: Sequelize, steps: readonly Migration[] = migrations) {
  const inTurn = (name: string, { isUp }: { isUp: boolean }, run: Migration["up"]): Promise<void> =>
    sequelize.transaction(async (transaction) => {
      await sequelize.query("select pg_advisory_xact_lock(hashtext('standproud migrations'))", { transaction });
      const [noted] = await sequelize.query(
        isUp
          ? "insert into migrations (name) values (:name) on conflict do nothing returning name"
          : "delete from migrations where name = :name returning name",
        { replacements: { name }, transaction },
      );
      // Another process did it while this one waited.
      if (noted.length === 0) return;
      await run(async (text) => {
        await sequelize.query(text, { transaction });
      });
    });
  return new Umzug({
    migrations: steps.map(({ name, up, down }) => ({
      name,
      up: () => inTurn(name, { isUp: true }, up),
      down: () => inTurn(name, { isUp: false }, down),
    })),
    storage: {
      async executed() {
        await sequelize.query(
          "select pg_advisory_xact_lock(hashtext('standproud migrations')); create table if not exists migrations (name text primary key)",
        );
        const rows = await sequelize.query<{ name: string }>("select name from migrations order by name", {
          type: QueryTypes.SELECT,
        });
        return rows.map(({ name }) => name);
      },
      logMigration: async () => undefined,
      unlogMigration: async () => undefined,
    },
    logger: undefined,
  });
}

/**
 * What the app's role may do: read and write rows, never own, empty or alter tables, never touch what is kept. It deletes
 * nothing but the naming of an approver; what people wrote stays as they wrote it.
 */
const grants = (role: string) => `
grant usage on schema public, graphile_worker to ${role};
grant select, insert, update on all tables in schema public to ${role};
revoke delete on all tables in schema public from ${role};
grant delete on job_approvers to ${role};
revoke update on events, decisions, certificates, stored_files, notes, replies, set_asides, mockup_starts, job_signals from ${role};
grant update (state, text, kind, edited_at) on notes to ${role};
grant update (text, edited_at) on replies to ${role};
grant update (taken_back_by, taken_back_name, taken_back_at) on set_asides to ${role};
revoke insert, update on migrations from ${role};
grant usage, select on all sequences in schema public to ${role};
grant select, insert, update, delete on all tables in schema graphile_worker to ${role};
grant usage, select on all sequences in schema graphile_worker to ${role};
grant execute on all functions in schema graphile_worker to ${role};
do $$ declare guarded record; begin
  -- The queue's tables show their rows to their owner only, unless a policy says otherwise.
  for guarded in select relname from pg_class where relnamespace = 'graphile_worker'::regnamespace and relrowsecurity loop
    execute format('drop policy if exists ${role}_works on graphile_worker.%I', guarded.relname);
    execute format('create policy ${role}_works on graphile_worker.%I to ${role} using (true) with check (true)', guarded.relname);
  end loop;
end $$;
`;

/**
 * Brings the database up to date: our tables, the queue's tables, and the rights of the app's role.
 * `appRole` is a plain role name that exists already; without one the app runs as the owner.
 */
export async function migrate({
  ownerUrl,
  appRole,
}: {
  ownerUrl: string;
  appRole?: string | undefined;
}): Promise<void> {
  if (appRole !== undefined && !/^[a-z_][a-z0-9_]{0,62}$/.test(appRole)) throw new Error(`Not a role name: ${appRole}`);
  const sequelize = connect(ownerUrl, { poolMax: 1 });
  try {
    await migrator(sequelize).up();
    await runMigrations({ connectionString: ownerUrl });
    if (appRole) await sequelize.query(grants(appRole));
  } finally {
    await sequelize.close();
  }
}
