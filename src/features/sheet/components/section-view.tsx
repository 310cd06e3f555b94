import { useMemo, useState } from "react";
import type { SheetView } from "#shared/contracts/revisions.ts";
import type { DrawingView } from "@/lib/drawing-view.ts";
import { DrawingViewer } from "@/lib/drawing-viewer.tsx";

type SectionViewProps = {
  readonly sheet: Pick<SheetView, "section" | "elevation">;
  /** The elevation stands beside it: the same height is fitted, so that both come out at one scale. */
  readonly isBeside: boolean;
};

/** The stack from the side. */
export function SectionView({ sheet, isBeside }: SectionViewProps) {
  const [view, setView] = useState<DrawingView | null>(null);
  const { section, elevation } = sheet;
  const fitTo = useMemo(
    () => ({ width: section.widthMm, height: Math.max(section.heightMm, isBeside ? elevation.heightMm : 0) }),
    [section, elevation, isBeside],
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
