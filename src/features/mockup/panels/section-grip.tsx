import { type KeyboardEvent, type PointerEvent, useRef } from "react";
import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import { type Drag, documentOfDrag, labelOfDrag } from "../model/drag.ts";
import { chooseLayer } from "../model/selection.ts";

type SectionGripProps = {
  readonly layerKey: string;
  readonly label: string;
  /** The measure that the grip changes, mm, and how it reads. */
  readonly now: number;
  readonly most: number;
  readonly text: string;
  readonly title: string;
  readonly drag: Drag | null;
  readonly onDrag: (drag: Drag | null) => void;
  readonly pxPerMm: number;
  readonly place: { readonly left: number; readonly top: number; readonly width: number; readonly height: number };
  /** So many mm towards the viewer from where it was taken; `free` asks to catch on nothing. */
  readonly onPull: (by: number, free: boolean) => void;
  readonly onStep: (towards: "viewer" | "wall", fine: boolean) => void;
};

/** Before that many px a press is no drag. */
const dragFromPx = 3;

/** What lies over a layer in the section, to be dragged towards the viewer or the wall, or moved by arrows. */
export function SectionGrip(props: SectionGripProps) {
  const { layerKey, label, now, most, text, title, drag, onDrag, pxPerMm, place } = props;
  const { document, selection, edit, choose } = useDesk();
  const isChosen = selection.layerKey === layerKey;
  const isDragged = drag !== null && "key" in drag && drag.key === layerKey;
  const from = useRef<number | null>(null);

  function take() {
    if (!isChosen) choose(chooseLayer(document, layerKey));
  }

  function handlePointerDown(event: PointerEvent<HTMLElement>) {
    if (event.button !== 0) return;
    take();
    event.currentTarget.setPointerCapture(event.pointerId);
    from.current = event.clientX;
  }

  function handlePointerMove(event: PointerEvent) {
    if (from.current === null) return;
    const px = event.clientX - from.current;
    if (isDragged || Math.abs(px) >= dragFromPx) props.onPull(px / pxPerMm, event.altKey);
  }

  function handlePointerUp() {
    from.current = null;
    if (!isDragged) return;
    edit({ label: labelOfDrag(drag), change: (before) => documentOfDrag(before, drag) });
    onDrag(null);
  }

  function giveUp() {
    from.current = null;
    if (isDragged) onDrag(null);
  }

  function handleKeyDown(event: KeyboardEvent) {
    if (event.key === "Escape") giveUp();
    const towards = stepOf[event.key];
    if (towards === undefined) return;
    event.preventDefault();
    // Not on focus: Tab leads past here with what is chosen.
    take();
    props.onStep(towards, event.shiftKey);
  }

  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-orientation="horizontal"
      aria-valuemin={0}
      aria-valuemax={most}
      aria-valuenow={now}
      aria-valuetext={text}
      title={title}
      onPointerDown={handlePointerDown}
      onPointerMove={handlePointerMove}
      onPointerUp={handlePointerUp}
      onPointerCancel={giveUp}
      onKeyDown={handleKeyDown}
      className={cx("absolute cursor-ew-resize touch-none", isChosen && "border border-dashed border-indigo")}
      style={place}
    />
  );
}

const stepOf: Readonly<Record<string, "viewer" | "wall">> = {
  ArrowRight: "viewer",
  ArrowUp: "viewer",
  ArrowLeft: "wall",
  ArrowDown: "wall",
};
