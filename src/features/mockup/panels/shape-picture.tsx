import { boxGrow, boxOfPath, boxOfPoints, boxUnion } from "#shared/geometry/box.ts";
import type { Path, Point } from "#shared/geometry/path.ts";
import { pathToText } from "#shared/geometry/path-text.ts";
import { cx } from "@/lib/cx.ts";

/** On the board, mm. */
export type ShapeInPicture = {
  readonly path: Path;
  /** What was there, what comes of it, what is taken off, and what is cut with. */
  readonly look: "was" | "made" | "taken" | "tool";
};

type ShapePictureProps = {
  readonly title: string;
  readonly shapes: readonly ShapeInPicture[];
  /** Drawn as lines across it. */
  readonly seams?: readonly (readonly [Point, Point])[];
  readonly isStale: boolean;
};

const looks: Record<ShapeInPicture["look"], string> = {
  was: "fill-none stroke-graphite",
  made: "fill-indigo/20 stroke-indigo",
  taken: "fill-oxblood/35 stroke-oxblood",
  tool: "fill-none stroke-ochre",
};

/** Room round the shapes, as a share of their larger side. */
const marginShare = 0.06;

/** Pieces as they are and as they would be. */
export function ShapePicture({ title, shapes, seams = [], isStale }: ShapePictureProps) {
  const box = boxUnion([...shapes.map(({ path }) => boxOfPath(path)), boxOfPoints(seams.flat())]);
  if (!box) return null;
  const { x, y, width, height } = boxGrow(box, Math.max(box.width, box.height, 1) * marginShare);
  return (
    <svg
      role="img"
      aria-label={title}
      aria-busy={isStale}
      viewBox={`${x} ${y} ${width} ${height}`}
      className={cx("h-72 w-full border border-rule bg-sheet", isStale && "opacity-60")}
    >
      {drawnApart(shapes).map(({ key, look, text }) => (
        <path
          key={key}
          d={text}
          fillRule="evenodd"
          vectorEffect="non-scaling-stroke"
          strokeWidth={look === "made" ? 1.5 : 1}
          {...(look === "tool" && { strokeDasharray: "5 4" })}
          className={looks[look]}
        />
      ))}
      {seams.map(([from, to]) => (
        <line
          key={`${from.x} ${from.y} ${to.x} ${to.y}`}
          x1={from.x}
          y1={from.y}
          x2={to.x}
          y2={to.y}
          vectorEffect="non-scaling-stroke"
          strokeWidth="2"
          strokeDasharray="10 4 2 4"
          className="stroke-madder"
        />
      ))}
    </svg>
  );
}

/** Shapes have no names of their own: they are told apart by what they look like and how many like them came before. */
function drawnApart(shapes: readonly ShapeInPicture[]) {
  const counts = new Map<string, number>();
  return shapes.map(({ path, look }) => {
    const count = (counts.get(look) ?? 0) + 1;
    counts.set(look, count);
    return { key: `${look} ${count}`, look, text: pathToText(path, 2) };
  });
}
