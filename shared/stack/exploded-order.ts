import type { Figures } from "./figures.ts";

/**
 * In which order a sign goes together, as an exploded view spreads it: keys by step, "A" (the backer) first. A layer comes
 * one step after the last thing that any of its pieces stands on; layers of one step stand on nothing of each other, and
 * lie as they do from the wall outward. A layer that stands on nothing goes on after the backer.
 */
export function explodedOrder({ layers, pieces }: Pick<Figures, "layers" | "pieces">): string[][] {
  const stepOf = new Map<string, number>([["A", 0]]);
  // Layers come from the wall outward and stand on nothing that comes after them.
  for (const { key } of layers) {
    const under = pieces.filter(({ layerKey }) => layerKey === key).flatMap(({ restsOn }) => restsOn);
    stepOf.set(key, 1 + under.reduce((most, below) => Math.max(most, stepOf.get(below) ?? 0), 0));
  }
  const steps: string[][] = [];
  for (const [key, step] of stepOf) {
    const together = steps[step] ?? [];
    together.push(key);
    steps[step] = together;
  }
  return steps;
}

/** The order in words: "A, then B and H, then C, D and E". */
export function orderWords(steps: readonly (readonly string[])[]): string {
  return steps
    .map((keys) => (keys.length < 2 ? keys.join("") : `${keys.slice(0, -1).join(", ")} and ${keys.at(-1)}`))
    .join(", then ");
}
