/** Where the answers about revisions lie in the cache, for the features that change one another's answers. */
export const revisionKeys = {
  revision: (shop: string, revisionId: string) => ["shop", shop, "revision", revisionId, "state"] as const,
  sheet: (shop: string, revisionId: string) => ["shop", shop, "revision", revisionId, "sheet"] as const,
  notes: (shop: string, revisionId: string) => ["shop", shop, "revision", revisionId, "notes"] as const,
  ofJob: (shop: string, jobId: string) => ["shop", shop, "job", jobId, "revisions"] as const,
  compare: (shop: string, jobId: string, before: string, after: string) =>
    ["shop", shop, "job", jobId, "compare", before, after] as const,
};
