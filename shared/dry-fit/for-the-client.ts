import type { Finding } from "./finding.ts";

/**
 * Rules whose findings are about the sign that the client gets: its colours, how it reads, where it stands, and
 * whom to ask. Every other one is about the making, and names the shop's stock, tools and handling; how slats are kept flat, too.
 */
const clientRules: ReadonlySet<number> = new Set([23, 24, 25, 27, 37, 38]);

/** What of the findings stands on the client's proof; the snapshot keeps them all. */
export function forTheClient(findings: readonly Finding[]): Finding[] {
  return findings.filter(({ rule }) => clientRules.has(rule));
}
