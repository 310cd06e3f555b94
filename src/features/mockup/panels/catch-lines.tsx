import { cx } from "@/lib/cx.ts";

type CatchLinesProps = {
  readonly lengths: readonly number[];
  readonly raised: number;
  readonly pxOf: (length: number) => number;
  readonly top: number;
  readonly bottom: number;
  readonly text: (length: number) => string;
};

/** The barrels in stock, as lines that a raised layer catches on. Labels that would run into one another stand on two lines. */
export function CatchLines({ lengths, raised, pxOf, top, bottom, text }: CatchLinesProps) {
  const lines = lengths.map((length, index) => {
    const x = pxOf(length);
    const before = lengths[index - 1];
    return {
      length,
      x,
      caught: Math.abs(length - raised) < 0.01,
      isNear: before !== undefined && x - pxOf(before) < 22,
    };
  });
  return (
    <svg aria-hidden="true" className="pointer-events-none absolute inset-0 size-full overflow-visible text-ochre">
      {lines.map(({ length, x, caught, isNear }, index) => (
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
          <text
            x={x}
            y={bottom + (isNear && index % 2 === 1 ? 29 : 16)}
            textAnchor="middle"
            fill="currentColor"
            className={cx("font-sans text-fine", caught && "font-semibold")}
          >
            {text(length)}
          </text>
        </g>
      ))}
    </svg>
  );
}
