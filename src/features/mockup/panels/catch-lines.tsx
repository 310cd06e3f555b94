import { cx } from "@/lib/cx.ts";
import { labelRows } from "../model/label-rows.ts";

type CatchLinesProps = {
  readonly lengths: readonly number[];
  readonly raised: number;
  readonly pxOf: (length: number) => number;
  readonly top: number;
  readonly bottom: number;
  readonly text: (length: number) => string;
};

/** The width of a figure of the labels' type, px, taken a little large. */
const figurePx = 8;

/**
 * The barrels in stock, as lines that a raised layer catches on. Labels that would run into one another stand on two rows;
 * one that finds no room on either is left out until the layer is caught there.
 */
export function CatchLines({ lengths, raised, pxOf, top, bottom, text }: CatchLinesProps) {
  const lines = lengths.map((length) => ({
    length,
    x: pxOf(length),
    label: text(length),
    caught: Math.abs(length - raised) < 0.01,
  }));
  const rows = labelRows(
    lines.map(({ x, label, caught }) => ({ x, width: label.length * figurePx, first: caught })),
    2,
  );
  return (
    <svg aria-hidden="true" className="pointer-events-none absolute inset-0 size-full overflow-visible text-ochre">
      {lines.map(({ length, x, label, caught }, index) => {
        const row = rows[index] ?? null;
        return (
          <g key={length}>
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
