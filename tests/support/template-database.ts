import pg from "pg";
import { migrate } from "#server/db/migrate.ts";
import { appRole, ownerRole } from "#server/start/roles.mjs";

/** The migrated database that every test database is a copy of. */
export const templateName = "standproud_template";

/** The address of a database in the test cluster for a role; the cluster trusts every role on loopback. */
export function testUrl(clusterUrl: string, role: string, database: string): string {
  const url = new URL(clusterUrl);
  url.username = role;
  url.pathname = `/${database}`;
  return url.href;
}

/** Runs statements as the superuser of the test cluster, one after the other, outside any transaction. */
export async function runOnCluster(clusterUrl: string, statements: readonly string[]): Promise<void> {
  const client = new pg.Client({ connectionString: clusterUrl });
  await client.connect();
  try {
    for (const statement of statements) await client.query(statement);
  } finally {
    await client.end();
  }
}

/** Makes the migrated template unless it is there; safe when several test processes share one cluster. */
export async function ensureTemplate(clusterUrl: string): Promise<void> {
  const client = new pg.Client({ connectionString: clusterUrl });
  await client.connect();
  try {
    await client.query("select pg_advisory_lock(hashtext($1))", [templateName]);
    const { rows } = await client.query("select datistemplate from pg_database where datname = $1", [templateName]);
    if (rows[0]?.datistemplate === true) return;
    await client.query(`drop database if exists ${templateName} with (force)`);
    await client.query(`create database ${templateName} owner ${ownerRole}`);
    await migrate({ ownerUrl: testUrl(clusterUrl, ownerRole, templateName), appRole });
    // Somebody connected to it would block every copy.
    await client.query(`alter database ${templateName} with is_template true allow_connections false`);
  } finally {
    await client.end();
  }
}
