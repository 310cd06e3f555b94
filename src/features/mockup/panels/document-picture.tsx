import { useMemo, useState } from "react";
import { emptyBrief } from "#shared/contracts/jobs.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { signBox } from "#shared/stack/sign-box.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import type { DrawingView } from "@/lib/drawing-view.ts";
import { DrawingViewer } from "@/lib/drawing-viewer.tsx";
import { useEngine } from "../engine/use-engine.ts";
import { dryFitContextOf } from "../model/dry-fit-context.ts";

/** Paper that a picture in a dialog is lettered for, mm on its longer side. */
const paperSideMm = 150;

type DocumentPictureProps = { readonly document: MockupDocument; readonly unit: LengthUnit; readonly title: string };

/** A document from the front, drawn as the desk draws it, to look at. */
export function DocumentPicture({ document, unit, title }: DocumentPictureProps) {
  const [view, setView] = useState<DrawingView | null>(null);
  const input = useMemo(() => {
    const { width, height } = signBox(document);
    return {
      document,
      // Only the elevation is looked at: what the dry fit would say of it is asked once it is on the desk.
      context: dryFitContextOf({ unit, brief: emptyBrief, stock: [] }),
      limits: defaultLimits,
      paperScale: Math.max(width, height) / paperSideMm,
      dimensions: false,
      what: "all" as const,
    };
  }, [document, unit]);
  const { drawn, failure } = useEngine(input);
  if (failure) return <Notice tone="error">{failure}</Notice>;
  if (drawn === null) return <Skeleton label="Drawing it" rowClassName="h-56" />;
  return (
    <DrawingViewer
      list={drawn.elevation}
      title={title}
      view={view}
      onView={setView}
      className="h-64 border border-rule bg-sheet"
    />
  );
}
