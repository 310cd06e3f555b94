import { memo, useMemo, useRef, useState } from "react";
import { boardOriginOf } from "#shared/drawing/elevation.ts";
import { drawSection } from "#shared/drawing/section.ts";
import { DrawingSvg } from "@/lib/drawing-svg.tsx";
import type { DrawingView } from "@/lib/drawing-view.ts";
import { useRoom } from "@/lib/use-room.ts";
import { paperScaleAt } from "../canvas/view-of-board.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { Drag } from "../model/drag.ts";
import { sectionHint } from "../model/section-hint.ts";
import { depthScaleFor } from "../model/section-scale.ts";
import { chooseHole, chooseLayer } from "../model/selection.ts";
import { SectionHandle } from "./section-handle.tsx";

type SectionPanelProps = {
  readonly view: DrawingView;
  readonly drag: Drag | null;
  readonly onDrag: (drag: Drag | null) => void;
};

const Picture = memo(DrawingSvg);
const insetPx = 10;

/** The stack from the side, at the elevation's own vertical scale and place. Standoff layers are raised here, and pockets cut deeper or less deep. */
export function SectionPanel({ view, drag, onDrag }: SectionPanelProps) {
  const { document, figures, figuresOf: drawn, unit, heights, choose } = useDesk();
  const element = useRef<HTMLDivElement>(null);
  const room = useRoom(element);
  const widthPx = room?.width ?? 300;
  const { scale } = view;
  const paperScale = paperScaleAt(scale);
  const wantedDepth =
    figures === null
      ? 1
      : depthScaleFor(
          { figures, gap: drawn.hanging.gap },
          { widthPx: widthPx - 2 * insetPx, scale, paperScale, heights },
        );
  const [depthScale, setDepthScale] = useState(wantedDepth);
  // Under a hand that raises a layer the scale stays, else the layer would run away from it.
  if (drag === null && wantedDepth !== depthScale) setDepthScale(wantedDepth);
  const list = useMemo(
    () => (figures === null ? null : drawSection({ document: drawn, figures, unit, paperScale, depthScale, heights })),
    [drawn, figures, unit, paperScale, depthScale, heights],
  );
  const origin = (list && boardOriginOf(list)) ?? { x: 0, y: 0 };
  const pxOfDepth = (mm: number) => insetPx + (origin.x + mm * depthScale) * scale;
  const pxOfHeight = (mm: number) => view.y + mm * scale;

  function handlePick(id: string | null) {
    if (id?.startsWith("layer:")) choose(chooseLayer(document, id.slice("layer:".length)));
    if (id?.startsWith("hole:")) choose(chooseHole(document, id.slice("hole:".length)));
  }

  return (
    <section
      aria-label="Section"
      data-desk-part
      className="relative h-full min-h-0 overflow-hidden border-l border-ink bg-sheet"
    >
      <div ref={element} className="absolute inset-0 overflow-hidden">
        {list && (
          <div
            className="absolute"
            style={{
              left: insetPx,
              top: view.y - origin.y * scale,
              width: list.widthMm * scale,
              height: list.heightMm * scale,
            }}
          >
            <Picture
              list={list}
              title="Section, from the side"
              className="block h-full w-full select-none"
              onPick={handlePick}
            />
          </div>
        )}
        {figures &&
          list &&
          document.layers.map((layer) => (
            <SectionHandle
              key={layer.key}
              layer={layer}
              figures={figures}
              pxPerMm={depthScale * scale}
              pxOfDepth={pxOfDepth}
              pxOfHeight={pxOfHeight}
              drag={drag}
              onDrag={onDrag}
            />
          ))}
      </div>
      <div className="pointer-events-none absolute inset-x-0 top-0 flex items-baseline justify-between gap-2 bg-sheet/90 px-2.5 pt-1.5">
        <h2 className="font-serif text-base font-bold text-ink">Section</h2>
        <p className="text-fine text-graphite">{sectionHint(document.layers)}</p>
      </div>
      <p className="pointer-events-none absolute inset-x-0 bottom-0 bg-sheet/90 px-2.5 pb-1 text-fine text-graphite">
        Depths {depthScale.toFixed(1)} times as large as heights
      </p>
    </section>
  );
}
