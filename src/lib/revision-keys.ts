import { keys } from "./query-keys.ts";

/** Where the answers about revisions lie in the cache, for the features that change one another's answers. */
export const revisionKeys = {
  revision: (shop: string, revisionId: string) => ["shop", shop, "revision", revisionId, "state"] as const,
  sheet: (shop: string, revisionId: string) => ["shop", shop, "revision", revisionId, "sheet"] as const,
  notes: (shop: string, revisionId: string) => ["shop", shop, "revision", revisionId, "notes"] as const,
  ofJob: (shop: string, jobId: string) => [...keys.job(shop, jobId), "all revisions"] as const,
  compare: (shop: string, jobId: string, before: string, after: string) =>
    [...keys.job(shop, jobId), "compare", before, after] as const,
};

/** Whether a key belongs to an answer about a revision of a shop: its standing, its sheet or its notes. */
export function isAboutRevision(key: readonly unknown[], shop: string): boolean {
  return key[0] === "shop" && key[1] === shop && key[2] === "revision";
}
