import type { Quad } from "#shared/wall/quad.ts";

/** The edges of the sheet as its four marks have them. */
export function SheetOutline({ corners, shown }: { readonly corners: Quad; readonly shown: number }) {
  const points = corners.map(({ x, y }) => `${x * shown},${y * shown}`).join(" ");
  return (
    <svg aria-hidden="true" className="pointer-events-none absolute inset-0 size-full text-indigo" fill="none">
      <polygon points={points} className="stroke-sheet" strokeWidth="3" />
      <polygon points={points} stroke="currentColor" strokeWidth="1.5" />
    </svg>
  );
}
