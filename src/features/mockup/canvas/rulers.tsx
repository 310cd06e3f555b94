import type { RefObject } from "react";
import type { Box } from "#shared/geometry/path.ts";
import { formatLength } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import type { DrawingView, Size } from "@/lib/drawing-view.ts";
import { type RulerLine, rulerLines } from "../model/ruler-steps.ts";
import { type Axis, type Span, spanOf } from "../model/span.ts";

/** How wide a ruler is, px. */
export const rulerPx = 24;

export type PointerMarks = {
  readonly x: RefObject<SVGLineElement | null>;
  readonly y: RefObject<SVGLineElement | null>;
};

type RulersProps = {
  readonly view: DrawingView;
  readonly room: Size;
  readonly unit: LengthUnit;
  /** What is chosen, on the board. */
  readonly chosen: Box | null;
  /** Lines that follow the pointer. */
  readonly pointer: PointerMarks;
};

/** Rulers along the top and the left of the elevation, from the board's upper left corner. They show what the figures of the panels say in words. */
export function Rulers({ view, room, unit, chosen, pointer }: RulersProps) {
  const ruler = (axis: Axis) => ({ unit, scale: view.scale, chosen: chosen && spanOf(chosen, axis) });
  return (
    <div aria-hidden="true" className="pointer-events-none absolute inset-0">
      <Ruler {...ruler("x")} axis="x" origin={view.x} length={room.width} mark={pointer.x} />
      <Ruler {...ruler("y")} axis="y" origin={view.y} length={room.height} mark={pointer.y} />
      <span className="absolute top-0 left-0 flex size-6 items-center justify-center border-r border-b border-rule bg-paper font-sans text-fine text-graphite">
        {unit}
      </span>
    </div>
  );
}

type RulerProps = {
  readonly axis: Axis;
  /** Where the board begins in the window, px. */
  readonly origin: number;
  readonly length: number;
  readonly scale: number;
  readonly unit: LengthUnit;
  readonly chosen: Span | null;
  readonly mark: RefObject<SVGLineElement | null>;
};

const figureRoomPx = 34;
const linePx: Readonly<Record<RulerLine["kind"], number>> = { figure: 10, middle: 7, line: 4 };

function Ruler({ axis, origin, length, scale, unit, chosen, mark }: RulerProps) {
  const place = (mm: number) => origin + mm * scale;
  const lines = rulerLines((rulerPx - origin) / scale, (length - origin) / scale, scale, unit);
  const path = lines
    .map(({ at, kind }) => {
      const along = Math.round(place(at)) + 0.5;
      return axis === "x"
        ? `M ${along} ${rulerPx} V ${rulerPx - linePx[kind]}`
        : `M ${rulerPx} ${along} H ${rulerPx - linePx[kind]}`;
    })
    .join(" ");
  const [width, height] = axis === "x" ? [length, rulerPx] : [rulerPx, length];
  const edge = axis === "x" ? `M 0 ${rulerPx - 0.5} H ${length}` : `M ${rulerPx - 0.5} 0 V ${length}`;
  return (
    <svg
      aria-hidden="true"
      width={width}
      height={height}
      className="absolute top-0 left-0 bg-paper/95 text-graphite"
      fill="none"
      stroke="currentColor"
    >
      {chosen && <ChosenSpan axis={axis} from={place(chosen.from)} to={place(chosen.to)} />}
      <path d={path} />
      <path d={edge} className="text-rule" stroke="currentColor" />
      {lines
        .filter(({ at, kind }) => kind === "figure" && hasRoom(axis, place(at), length))
        .map(({ at }) => {
          const along = Math.round(place(at));
          // Read from below and from the right, as the figures of dimensions are.
          const spot = axis === "x" ? { x: along + 3, y: 12 } : { x: 12, y: along - 3 };
          return (
            <text
              key={at}
              {...spot}
              transform={axis === "x" ? undefined : `rotate(-90 ${spot.x} ${spot.y})`}
              stroke="none"
              fill="currentColor"
              className="font-sans text-fine tabular-nums"
            >
              {formatLength(at, unit)}
            </text>
          );
        })}
      <line
        ref={mark}
        x1={0}
        y1={0}
        x2={axis === "x" ? 0 : rulerPx}
        y2={axis === "x" ? rulerPx : 0}
        className="invisible text-madder"
      />
    </svg>
  );
}

function ChosenSpan({ axis, from, to }: { readonly axis: Axis; readonly from: number; readonly to: number }) {
  const box =
    axis === "x"
      ? { x: from, y: 0, width: to - from, height: rulerPx }
      : { x: 0, y: from, width: rulerPx, height: to - from };
  return <rect {...box} className="fill-indigo/20" stroke="none" />;
}

/** Whether a figure has room before the corner or the end: neither is ever cut. */
const hasRoom = (axis: Axis, along: number, length: number) =>
  axis === "x" ? along + figureRoomPx < length : along - figureRoomPx > rulerPx;
