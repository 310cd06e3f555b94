import { type KeyboardEvent, type PointerEvent, useRef } from "react";
import { boxUnion } from "#shared/geometry/box.ts";
import type { Layer } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";
import { formatLength, formatLengthWithUnit } from "#shared/units/format-length.ts";
import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import { raiseLayer } from "../model/commands/set-hold.ts";
import type { Drag } from "../model/drag.ts";
import { chooseLayer } from "../model/selection.ts";
import { barrelLengths, catchBarrel, hardwareOfLength, nextBarrel } from "../model/snapping.ts";
import { CatchLines } from "./catch-lines.tsx";

type RaiseHandleProps = {
  readonly layer: Layer;
  readonly figures: Figures;
  readonly pxPerMm: number;
  readonly pxOfDepth: (mm: number) => number;
  readonly pxOfHeight: (mm: number) => number;
  readonly drag: Drag | null;
  readonly onDrag: (drag: Drag | null) => void;
};

const catchPx = 7;
const mostOffsetMm = 1000;
const fineStepMm = 0.5;

/** Lies over a layer in the section: a standoff layer is dragged by it or moved by arrows, from barrel to barrel. */
export function RaiseHandle({ layer, figures, pxPerMm, pxOfDepth, pxOfHeight, drag, onDrag }: RaiseHandleProps) {
  const { document, figuresOf: drawn, edit, choose, selection, stock, unit } = useDesk();
  const from = useRef<{ x: number; offset: number } | null>(null);
  const { key, hold } = layer;
  const isChosen = selection.layerKey === key;
  const own = figures.layers.find((one) => one.key === key);
  const shown = drawn.layers.find((one) => one.key === key);
  const box = boxUnion(figures.pieces.filter(({ layerKey }) => layerKey === key).map((piece) => piece.box));
  if (!own || !box || layer.hidden) return null;

  const place = {
    left: pxOfDepth(own.bottom.nominal) - 4,
    top: pxOfHeight(box.y) - 4,
    width: (own.top.nominal - own.bottom.nominal) * pxPerMm + 8,
    height: pxOfHeight(box.y + box.height) - pxOfHeight(box.y) + 8,
  };
  if (hold.kind !== "standoff" || shown?.hold.kind !== "standoff")
    return isChosen ? <span aria-hidden="true" className={cx(markClass, "border-indigo")} style={place} /> : null;

  const { hardware, offset } = hold;
  const foot = own.bottom.nominal - shown.hold.offset;
  const raised = drag?.kind === "raise" && drag.key === key ? drag.offset : offset;

  function handlePointerDown(event: PointerEvent<HTMLElement>) {
    if (event.button !== 0) return;
    choose(chooseLayer(document, key));
    event.currentTarget.setPointerCapture(event.pointerId);
    from.current = { x: event.clientX, offset };
  }

  function handlePointerMove(event: PointerEvent) {
    if (from.current === null) return;
    const by = (event.clientX - from.current.x) / pxPerMm;
    if (drag === null && Math.abs(by * pxPerMm) < 3) return;
    const free = Math.min(mostOffsetMm, Math.max(0, from.current.offset + by));
    const reachMm = event.altKey ? 0 : catchPx / pxPerMm;
    const caught = catchBarrel(Math.round(free * 10) / 10, { stock: stock.hardware, current: hardware, reachMm });
    onDrag({ kind: "raise", key, ...caught });
  }

  function handlePointerUp() {
    from.current = null;
    if (drag?.kind !== "raise") return;
    const dropped = drag;
    edit({ label: `Raise ${key}`, change: (before) => raiseLayer(before, dropped) });
    onDrag(null);
  }

  function handleKeyDown(event: KeyboardEvent) {
    const up = event.key === "ArrowRight" || event.key === "ArrowUp";
    const down = event.key === "ArrowLeft" || event.key === "ArrowDown";
    if (event.key === "Escape" && drag !== null) {
      from.current = null;
      onDrag(null);
    }
    if (!up && !down) return;
    event.preventDefault();
    const fine = offset + (up ? fineStepMm : -fineStepMm);
    const to = event.shiftKey ? fine : nextBarrel(offset, [...stock.hardware, hardware], up ? "up" : "down");
    if (to === undefined) return;
    const taken = hardwareOfLength(to, stock.hardware, hardware);
    edit({
      label: `Raise ${key}`,
      together: `raise ${key}`,
      change: (before) => raiseLayer(before, { key, offset: to, hardware: taken }),
    });
  }

  return (
    <>
      {isChosen && (
        <CatchLines
          lengths={barrelLengths([...stock.hardware, hardware])}
          raised={raised}
          pxOf={(length) => pxOfDepth(foot + length)}
          top={pxOfHeight(0)}
          bottom={pxOfHeight(drawn.board.height)}
          text={(length) => formatLength(length, unit)}
        />
      )}
      <div
        role="slider"
        tabIndex={0}
        aria-label={`Raise ${key}, ${layer.name}`}
        aria-orientation="horizontal"
        aria-valuemin={0}
        aria-valuemax={mostOffsetMm}
        aria-valuenow={raised}
        aria-valuetext={`${formatLengthWithUnit(raised, unit)}, ${hardware.name}`}
        title="Drag to raise. Arrows go from barrel to barrel, with Shift by half a millimetre."
        onPointerDown={handlePointerDown}
        onPointerMove={handlePointerMove}
        onPointerUp={handlePointerUp}
        onPointerCancel={() => {
          from.current = null;
          onDrag(null);
        }}
        onKeyDown={handleKeyDown}
        onFocus={() => {
          if (!isChosen) choose(chooseLayer(document, key));
        }}
        className={cx("absolute cursor-ew-resize touch-none", isChosen && "border border-dashed border-indigo")}
        style={{ ...place, left: place.left + (raised - shown.hold.offset) * pxPerMm }}
      />
    </>
  );
}

const markClass = "pointer-events-none absolute border border-dashed";
