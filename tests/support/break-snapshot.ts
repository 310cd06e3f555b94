import type { TestDatabase } from "./database.ts";
import { runSql } from "./run-sql.ts";

/**
 * Spoils the frozen text of a revision the way a bad disk or a hand in the database would. Only the tables' owner can,
 * and only with the guard set aside.
 */
export async function breakSnapshot({ ownerUrl }: TestDatabase, revisionId: string): Promise<void> {
  await runSql(ownerUrl, "alter table revisions disable trigger revisions_guarded");
  try {
    await runSql(ownerUrl, `update revisions set snapshot = replace(snapshot, '"p1"', '"q1"') where id = $1`, [
      revisionId,
    ]);
  } finally {
    await runSql(ownerUrl, "alter table revisions enable trigger revisions_guarded");
  }
}
