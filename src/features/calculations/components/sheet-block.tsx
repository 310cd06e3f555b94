import type { ExamplesState } from "../engine/use-worked-examples.ts";

/** The block at the lower right of the sheet: what it holds, in which units, and how its examples came out. */
export function SheetBlock({ total, state }: { readonly total: number; readonly state: ExamplesState }) {
  const fields = [
    ["Title", "How we work it out"],
    ["Calculations", String(total)],
    ["Examples", wordsOf(total, state)],
    ["Computed in", "mm and degrees"],
  ] as const;
  return (
    <dl className="mt-16 ml-auto grid w-full max-w-xl grid-cols-2 border-t border-l border-ink bg-sheet text-sm">
      {fields.map(([name, value]) => (
        <div key={name} className="border-r border-b border-ink px-3 py-1.5">
          <dt className="text-fine text-graphite">{name}</dt>
          <dd className="font-serif tabular-nums text-ink">{value}</dd>
        </div>
      ))}
    </dl>
  );
}

function wordsOf(total: number, state: ExamplesState): string {
  if (state.step === "computing") return "being computed";
  if (state.step === "failed") return "not computed";
  const right = Object.values(state.examples).filter(({ ok }) => ok).length;
  return `${right} of ${total} computed now`;
}
