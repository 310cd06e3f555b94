import type { TestProject } from "vitest/node";
import { ensureBuild } from "#server/start/build.mjs";
import { checkoutOf } from "#server/start/data-folder.mjs";
import { ensureTemplate } from "./template-database.ts";
import { startThrowawayCluster } from "./throwaway-cluster.mjs";

let stopCluster: (() => Promise<void>) | undefined;

/**
 * Before the first test of a project that needs the database: a cluster, unless the test runner or another project
 * has started one, and the migrated template in it. Browser tests also need what the server serves.
 */
export async function setup({ name }: TestProject): Promise<void> {
  if (process.env.TEST_CLUSTER_URL === undefined) {
    const cluster = await startThrowawayCluster();
    stopCluster = cluster.stop;
    process.env.TEST_CLUSTER_URL = cluster.url;
  }
  await ensureTemplate(process.env.TEST_CLUSTER_URL);
  if (name === "e2e" || name === "long") await ensureBuild(checkoutOf(import.meta.url));
}

export async function teardown(): Promise<void> {
  if (stopCluster === undefined) return;
  delete process.env.TEST_CLUSTER_URL;
  await stopCluster();
}
