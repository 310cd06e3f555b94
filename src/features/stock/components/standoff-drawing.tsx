import { useId } from "react";
import type { LengthUnit } from "#shared/units/length.ts";
import { cx } from "@/lib/cx.ts";
import type { Matter } from "../model/section-bodies.ts";
import { digitWidth, type LaidDimension, layOutSection } from "../model/section-layout.ts";
import { standoffSection } from "../model/standoff-section.ts";
import type { WrittenHardware } from "../model/written.ts";

/** px, as much as a phone has; where there is more the drawing is enlarged. */
const drawingWidth = 300;

/** Each measure of the form at its place: the standoff cut along its axis, wood to the left and the viewer to the right. */
export function StandoffDrawing({
  hardware,
  unit,
  active,
}: {
  readonly hardware: WrittenHardware;
  readonly unit: LengthUnit;
  /** The field that is being written. */
  readonly active: string | null;
}) {
  const id = useId();
  const laid = layOutSection(standoffSection(hardware), {
    width: drawingWidth,
    tallest: 150,
    unit,
  });
  const words = laid.dimensions.map(({ number, label, text }) => `${number} ${label}${text === "" ? "" : `: ${text}`}`);
  return (
    <figure className="border border-rule bg-paper p-2">
      <svg
        role="img"
        aria-label={`The standoff in section. ${words.join("; ")}.`}
        viewBox={`0 0 ${laid.width} ${laid.height}`}
        className="mx-auto block w-full max-w-96"
      >
        <defs>
          <Hatching id={`${id}-metal`} turn={45} />
          <Hatching id={`${id}-panel`} turn={-45} />
          <Hatching id={`${id}-wood`} turn={90} />
        </defs>
        {laid.bodies.map(({ matter, points }) => (
          <g key={`${matter} ${points}`}>
            <polygon points={points} className={cx("stroke-ink", fills[matter])} strokeWidth="1" />
            {isCut(matter) && <polygon points={points} fill={`url(#${id}-${matter})`} />}
          </g>
        ))}
        <line
          {...endsOf(laid.axis)}
          className="stroke-graphite"
          strokeWidth="0.75"
          strokeDasharray="14 3 2 3"
          fill="none"
        />
        {laid.dimensions.map(({ field, helpers }) => (
          <HelperLines key={field} helpers={helpers} isActive={field === active} />
        ))}
        {laid.dimensions.map((dimension) => (
          <DimensionMark key={dimension.field} dimension={dimension} isActive={dimension.field === active} />
        ))}
      </svg>
      <figcaption className="mt-1 text-center text-fine text-graphite">
        In section: wood to the left, the viewer to the right. The panel is drawn for scale.
      </figcaption>
    </figure>
  );
}

const fills: Readonly<Record<Matter, string>> = {
  wood: "fill-linen",
  panel: "fill-sheet",
  metal: "fill-rule",
  hollow: "fill-sheet",
  screw: "fill-rule",
};

const isCut = (matter: Matter): boolean => matter === "wood" || matter === "panel" || matter === "metal";

/** Thin parallel lines, as on what is cut through. */
function Hatching({ id, turn }: { readonly id: string; readonly turn: number }) {
  return (
    <pattern id={id} width="6" height="6" patternUnits="userSpaceOnUse" patternTransform={`rotate(${turn})`}>
      <line x1="0" y1="0" x2="0" y2="6" className="stroke-graphite" strokeWidth="0.8" />
    </pattern>
  );
}

type Line = LaidDimension["line"];
const endsOf = ({ from, to }: Line) => ({ x1: from.x, y1: from.y, x2: to.x, y2: to.y });

/** Below all labels, so that none is crossed out. */
function HelperLines({ helpers, isActive }: { readonly helpers: readonly Line[]; readonly isActive: boolean }) {
  return helpers.map((helper) => (
    <line
      key={`${helper.from.x} ${helper.to.x}`}
      {...endsOf(helper)}
      className={isActive ? "stroke-indigo" : "stroke-graphite"}
      strokeWidth={isActive ? 1.25 : 0.6}
    />
  ));
}

function DimensionMark({ dimension, isActive }: { readonly dimension: LaidDimension; readonly isActive: boolean }) {
  const { number, text, line, balloon } = dimension;
  const stroke = isActive ? "stroke-indigo" : "stroke-graphite";
  return (
    <g strokeWidth={isActive ? 2 : 1}>
      <line {...endsOf(line)} className={stroke} />
      <Arrow at={line.from} away={line.to} isActive={isActive} />
      <Arrow at={line.to} away={line.from} isActive={isActive} />
      <rect
        x={balloon.x}
        y={balloon.y - 9}
        width={text === "" ? 0 : 14 + text.length * digitWidth}
        height="18"
        className="fill-paper"
      />
      <circle
        cx={balloon.x}
        cy={balloon.y}
        r="10"
        className={isActive ? "fill-indigo stroke-indigo" : "fill-sheet stroke-ink"}
      />
      <text
        x={balloon.x}
        y={balloon.y + 4.5}
        textAnchor="middle"
        className={cx("font-serif text-[13px] font-bold", isActive ? "fill-sheet" : "fill-ink")}
        strokeWidth="0"
      >
        {number}
      </text>
      {text !== "" && (
        <text
          x={balloon.x + 14}
          y={balloon.y + 4.5}
          className={cx("font-sans text-[13px] tabular-nums", isActive ? "fill-indigo" : "fill-ink")}
          strokeWidth="0"
        >
          {text}
        </text>
      )}
    </g>
  );
}

/** The slim arrowhead at one end of a dimension line. */
function Arrow({
  at,
  away,
  isActive,
}: {
  readonly at: Line["from"];
  readonly away: Line["from"];
  readonly isActive: boolean;
}) {
  const length = Math.hypot(away.x - at.x, away.y - at.y);
  if (length < 4) return null;
  const along = { x: (away.x - at.x) / length, y: (away.y - at.y) / length };
  const reach = Math.min(7, length / 2);
  const corner = (side: number) =>
    `${at.x + along.x * reach - along.y * side},${at.y + along.y * reach + along.x * side}`;
  return (
    <polygon
      points={`${at.x},${at.y} ${corner(2)} ${corner(-2)}`}
      className={isActive ? "fill-indigo" : "fill-graphite"}
    />
  );
}
