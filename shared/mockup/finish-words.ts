import type { Coat } from "./document.ts";

/** A finish in words, coat by coat in the order they go on: "sanded to 180, Pale wash, Clear satin, 2 coats"; "bare" without any. */
export function finishWords(coats: readonly Coat[]): string {
  const runs: { words: string; times: number }[] = [];
  for (const coat of coats) {
    const words = coat.kind === "sanding" ? `sanded to ${coat.grit}` : coat.name;
    const last = runs.at(-1);
    if (last?.words === words) last.times += 1;
    else runs.push({ words, times: 1 });
  }
  if (runs.length === 0) return "bare";
  return runs.map(({ words, times }) => (times === 1 ? words : `${words}, ${times} coats`)).join(", ");
}
