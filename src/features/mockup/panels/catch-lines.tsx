import { cx } from "@/lib/cx.ts";
import { labelRows } from "../model/label-rows.ts";

type CatchLinesProps = {
  readonly lines: readonly { readonly at: number; readonly label: string }[];
  /** The measure as it is now, mm: the line there is the one that caught. */
  readonly now: number;
  readonly pxOf: (mm: number) => number;
  readonly top: number;
  readonly bottom: number;
};

/** The width of a figure of the labels' type, px, taken a little large. */
const figurePx = 8;

/**
 * What a dragged layer catches on in the section: barrels in stock, depths of a pocket. Labels that would run into one another stand on two rows;
 * one that finds no room on either is left out until the layer is caught there.
 */
export function CatchLines({ lines: wanted, now, pxOf, top, bottom }: CatchLinesProps) {
  const lines = wanted.map(({ at, label }) => ({ at, x: pxOf(at), label, caught: Math.abs(at - now) < 0.01 }));
  const rows = labelRows(
    lines.map(({ x, label, caught }) => ({ x, width: label.length * figurePx, first: caught })),
    2,
  );
  return (
    <svg aria-hidden="true" className="pointer-events-none absolute inset-0 size-full overflow-visible text-ochre">
      {lines.map(({ at, x, label, caught }, index) => {
        const row = rows[index] ?? null;
        return (
          <g key={at}>
            <line
              x1={x}
              x2={x}
              y1={top}
              y2={bottom}
              stroke="currentColor"
              strokeWidth={caught ? 1.5 : 1}
              strokeDasharray="2 3"
            />
            {row !== null && (
              <text
                x={x}
                y={bottom + 16 + 13 * row}
                textAnchor="middle"
                fill="currentColor"
                className={cx("font-sans text-fine", caught && "font-semibold")}
              >
                {label}
              </text>
            )}
          </g>
        );
      })}
    </svg>
  );
}
