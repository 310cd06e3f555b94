/**
 * First parts of the keys under which answers are kept, so that one subject's write can refresh another's list.
 * Refreshing `job` refreshes everything kept below it: revisions, artwork, log.
 */
export const keys = {
  jobs: (shop: string) => ["jobs", shop] as const,
  job: (shop: string, jobId: string) => ["job", shop, jobId] as const,
  clients: (shop: string) => ["clients", shop] as const,
  client: (shop: string, clientId: string) => ["client", shop, clientId] as const,
  team: (shop: string) => ["team", shop] as const,
  stock: (shop: string) => ["stock", shop] as const,
  portfolio: (shop: string) => ["portfolio", shop] as const,
  shareLinks: (shop: string) => ["share links", shop] as const,
  limits: (shop: string) => ["limits", shop] as const,
  saws: (shop: string) => ["saws", shop] as const,
  prices: (shop: string) => ["prices", shop] as const,
  outgoingMail: (shop: string) => ["outgoing mail", shop] as const,
} as const;
