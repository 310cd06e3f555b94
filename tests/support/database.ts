import { randomBytes } from "node:crypto";
import { appRole, databaseRightsSql, ownerRole } from "#server/start/roles.mjs";
import { runOnCluster, templateName, testUrl } from "./template-database.ts";

export type TestDatabase = {
  /** For migrations and for looking behind the application's back. */
  ownerUrl: string;
  /** What the application under test gets. */
  appUrl: string;
  /** How many connections the application's pool may have. */
  poolMax: number;
  /** Removes the database, whoever is still connected to it. */
  drop: () => Promise<void>;
};

/**
 * Makes a database of its own for a test file: a copy of the migrated template, empty of rows. A pool of one makes a
 * call that forgot its transaction time out; a test of races asks for more.
 */
export async function createTestDatabase({ poolMax = 1 }: { poolMax?: number } = {}): Promise<TestDatabase> {
  const clusterUrl = process.env.TEST_CLUSTER_URL;
  if (clusterUrl === undefined) {
    throw new Error(
      "No test cluster: a test that needs the database belongs into tests/api, tests/db, tests/e2e or tests/long.",
    );
  }
  const name = `test_${randomBytes(8).toString("hex")}`;
  await runOnCluster(clusterUrl, [
    `create database ${name} template ${templateName} owner ${ownerRole}`,
    // A copy keeps the rights on everything inside it, but not those on the database itself.
    databaseRightsSql(name),
  ]);
  return {
    ownerUrl: testUrl(clusterUrl, ownerRole, name),
    appUrl: testUrl(clusterUrl, appRole, name),
    poolMax,
    drop: () => runOnCluster(clusterUrl, [`drop database if exists ${name} with (force)`]),
  };
}
