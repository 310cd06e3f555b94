/** What is drawn together: things that rest, or things that move together, by their places in the drawing order. */
export type Run = { readonly moves: boolean; readonly places: readonly number[] };

type Drawn = { readonly id: string | null; readonly layer: string | null };

/**
 * Drawn things as few runs, in drawing order. Neighbours of one layer lie beside one another, so that those of them that
 * rest can be drawn before those that move.
 */
export function flatRuns(drawn: readonly Drawn[], moving: ReadonlySet<string>): Run[] {
  const runs: { moves: boolean; places: number[] }[] = [];
  const add = (moves: boolean, places: readonly number[]) => {
    const last = runs.at(-1);
    if (places.length === 0) return;
    if (last?.moves === moves) last.places.push(...places);
    else runs.push({ moves, places: [...places] });
  };
  let block: { readonly layer: string | null; readonly still: number[]; readonly moved: number[] } | null = null;
  const close = () => {
    add(false, block?.still ?? []);
    add(true, block?.moved ?? []);
  };
  drawn.forEach(({ id, layer }, place) => {
    if (block === null || block.layer !== layer) {
      close();
      block = { layer, still: [], moved: [] };
    }
    if (id !== null && moving.has(id)) block.moved.push(place);
    else block.still.push(place);
  });
  close();
  return runs;
}
