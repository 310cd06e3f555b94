import type { DisplayList } from "#shared/drawing/display-list.ts";
import { DrawingSvg } from "@/lib/drawing-svg.tsx";
import { mmPerPx, paddingPx } from "./use-paper.ts";

/** A drawing on a sheet of its own, as wide as its lettering can be read at, that a printer does not cut in two. */
export function DrawingBlock({ list, title }: { readonly list: DisplayList; readonly title: string }) {
  return (
    <div
      className="w-full break-inside-avoid border border-rule bg-sheet p-2 sm:p-3"
      style={{ maxWidth: list.widthMm / mmPerPx + paddingPx }}
    >
      <DrawingSvg list={list} title={title} className="block h-auto w-full" />
    </div>
  );
}
