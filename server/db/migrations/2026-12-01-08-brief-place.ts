import type { Migration } from "../migration.ts";

/** Briefs say whether people pass the sign, stand under it, and whether it has electrical parts; none did before. */
export const briefPlace: Migration = {
  name: "2026-12-01-08-brief-place",
  up: (sql) =>
    sql(`update jobs set brief = '{"walkway": false, "overhead": false, "electrical": false}'::jsonb || brief`),
  down: (sql) => sql("update jobs set brief = brief - 'walkway' - 'overhead' - 'electrical'"),
};
