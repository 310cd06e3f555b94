import type { DisplayList } from "#shared/drawing/display-list.ts";
import { DrawingSvg } from "@/lib/drawing-svg.tsx";

/** A drawing on a sheet of its own, that a printer does not cut in two. */
export function DrawingBlock({ list, title }: { readonly list: DisplayList; readonly title: string }) {
  return (
    <div className="break-inside-avoid border border-rule bg-sheet p-2 sm:p-3">
      <DrawingSvg list={list} title={title} className="block h-auto w-full" />
    </div>
  );
}
