import { useMemo, useState } from "react";
import type { SheetView } from "#shared/contracts/revisions.ts";
import type { DrawingView } from "@/lib/drawing-view.ts";
import { DrawingViewer } from "@/lib/drawing-viewer.tsx";

/** The stack from the side, with room for the elevation's height so that both views come out level. */
export function SectionView({ sheet }: { readonly sheet: Pick<SheetView, "section" | "elevation"> }) {
  const [view, setView] = useState<DrawingView | null>(null);
  const { section, elevation } = sheet;
  const fitTo = useMemo(
    () => ({ width: section.widthMm, height: Math.max(section.heightMm, elevation.heightMm) }),
    [section, elevation],
  );
  return (
    <DrawingViewer
      list={section}
      title="Section, the stack from the side"
      view={view}
      onView={setView}
      fitTo={fitTo}
      className="h-full"
    />
  );
}
