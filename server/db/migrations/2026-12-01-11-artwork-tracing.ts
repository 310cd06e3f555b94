import type { Migration } from "../migration.ts";

/**
 * Artwork that came from a picture: how it was traced, how it is to be traced again while that is under way, and why that failed the last time.
 * Meanwhile the artwork stays what it was.
 */
export const artworkTracing: Migration = {
  name: "2026-12-01-11-artwork-tracing",
  up: (sql) =>
    sql(`
alter table artworks
  add column trace jsonb check (jsonb_typeof(trace) = 'object'),
  add column trace_asked jsonb check (jsonb_typeof(trace_asked) = 'object'),
  add column trace_failure jsonb check (jsonb_typeof(trace_failure) = 'object'),
  add check (trace is null or state = 'ready'),
  add check (trace_asked is null or state <> 'importing');
`),
  down: (sql) => sql("alter table artworks drop column trace, drop column trace_asked, drop column trace_failure"),
};
