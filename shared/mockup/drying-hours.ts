import type { Coat } from "./document.ts";

/** Hours that the coats of a finish dry, one after the other. Sanding takes none. */
export function dryingHours(coats: readonly Coat[]): number {
  return coats.reduce((sum, coat) => sum + (coat.kind === "sanding" ? 0 : coat.dryingHours), 0);
}
