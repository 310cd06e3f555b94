import { boxUnion } from "#shared/geometry/box.ts";
import type { Layer } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { Drag } from "../model/drag.ts";
import { PocketHandle } from "./pocket-handle.tsx";
import { RaiseHandle } from "./raise-handle.tsx";

export type SectionHandleProps = {
  readonly layer: Layer;
  readonly figures: Figures;
  readonly pxPerMm: number;
  readonly pxOfDepth: (mm: number) => number;
  readonly pxOfHeight: (mm: number) => number;
  readonly drag: Drag | null;
  readonly onDrag: (drag: Drag | null) => void;
};

/** Where a layer lies in the section: px in the panel, and mm above the back of the board. */
export type LayerInSection = {
  readonly bottom: number;
  readonly place: { readonly left: number; readonly top: number; readonly width: number; readonly height: number };
};

const roundItPx = 4;

/**
 * What lies over a layer in the section: a standoff layer is raised by it, one that is let in is sunk deeper or less deep; of
 * a bonded or locked one it only marks that it is chosen.
 */
export function SectionHandle(props: SectionHandleProps) {
  const { layer, figures, pxPerMm, pxOfDepth, pxOfHeight } = props;
  const { figuresOf: drawn, selection } = useDesk();
  const own = figures.layers.find(({ key }) => key === layer.key);
  const shown = drawn.layers.find(({ key }) => key === layer.key);
  const box = boxUnion(figures.pieces.filter(({ layerKey }) => layerKey === layer.key).map((piece) => piece.box));
  if (!own || !shown || !box || layer.hidden) return null;

  const bottom = own.bottom.nominal;
  const place = {
    left: pxOfDepth(bottom) - roundItPx,
    top: pxOfHeight(box.y) - roundItPx,
    width: (own.top.nominal - bottom) * pxPerMm + 2 * roundItPx,
    height: box.height * (pxOfHeight(1) - pxOfHeight(0)) + 2 * roundItPx,
  };
  const at = { bottom, place };
  if (!layer.locked && layer.hold.kind === "standoff" && shown.hold.kind === "standoff")
    return <RaiseHandle {...props} hold={layer.hold} shownOffset={shown.hold.offset} at={at} />;
  if (!layer.locked && layer.hold.kind === "pocket" && shown.hold.kind === "pocket")
    return <PocketHandle {...props} hold={layer.hold} shownDepth={shown.hold.depth} at={at} />;
  if (selection.layerKey !== layer.key) return null;
  return (
    <span
      aria-hidden="true"
      className="pointer-events-none absolute border border-dashed border-indigo"
      style={at.place}
    />
  );
}
