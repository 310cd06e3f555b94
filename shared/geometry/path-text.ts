import svgpath from "svgpath";
import { cubicOfQuadratic } from "./cubic-of-quadratic.ts";
import type { Path, Point, Ring, Segment } from "./path.ts";

/**
 * A path as SVG path data of M, L, C and Z, for `fill-rule="evenodd"`. Numbers are rounded to `decimals` places
 * (3, the kernel's grid, unless said otherwise). An empty path gives an empty text.
 */
export function pathToText(path: Path, decimals = 3): string {
  const number = (value: number) => {
    const rounded = Number(value.toFixed(decimals));
    return String(rounded === 0 ? 0 : rounded);
  };
  const pair = ({ x, y }: Point) => `${number(x)} ${number(y)}`;
  return path
    .map(({ start, segments }) => {
      const steps = segments.map((segment) =>
        segment.kind === "line"
          ? `L${pair(segment.to)}`
          : `C${pair(segment.c1)} ${pair(segment.c2)} ${pair(segment.to)}`,
      );
      return `M${pair(start)}${steps.join("")}Z`;
    })
    .join("");
}

/** A subpath of SVG path data: `closed` says whether it ended in Z. One without segments is a lone move or a point. */
export type Subpath = Ring & { readonly closed: boolean };

/**
 * Reads any SVG path data; arcs and quadratics become cubics. Every subpath counts as closed, as SVG fills it; those
 * without a segment are left out. Returns null for data that is not valid SVG path data or holds numbers that are not finite.
 */
export function pathFromText(text: string): Path | null {
  const subpaths = subpathsFromText(text);
  return (
    subpaths?.filter(({ segments }) => segments.length > 0).map(({ start, segments }) => ({ start, segments })) ?? null
  );
}

/** Reads SVG path data subpath by subpath, for outlines that are drawn with a pen. Null as in `pathFromText`. */
export function subpathsFromText(text: string): Subpath[] | null {
  const parsed = svgpath(text).abs().unarc().unshort();
  // The reader keeps what stood before the fault in `err`; its types don't tell of it.
  if ("err" in parsed && parsed.err) return null;
  const subpaths: { start: Point; segments: Segment[]; closed: boolean }[] = [];
  let current: { start: Point; segments: Segment[]; closed: boolean } | null = null;
  let finite = true;
  parsed.iterate((step, _index, x, y) => {
    const [command, ...numbers] = step as [string, ...number[]];
    if (!numbers.every(Number.isFinite)) finite = false;
    const n = (index: number) => numbers[index] ?? 0;
    const open = () => {
      // After Z the next subpath starts where the closed one began, without a move.
      if (current && !current.closed) return current;
      current = { start: { x, y }, segments: [], closed: false };
      subpaths.push(current);
      return current;
    };
    switch (command) {
      case "M":
        current = { start: { x: n(0), y: n(1) }, segments: [], closed: false };
        subpaths.push(current);
        break;
      case "L":
        open().segments.push({ kind: "line", to: { x: n(0), y: n(1) } });
        break;
      case "H":
        open().segments.push({ kind: "line", to: { x: n(0), y } });
        break;
      case "V":
        open().segments.push({ kind: "line", to: { x, y: n(0) } });
        break;
      case "C":
        open().segments.push({
          kind: "cubic",
          c1: { x: n(0), y: n(1) },
          c2: { x: n(2), y: n(3) },
          to: { x: n(4), y: n(5) },
        });
        break;
      case "Q":
        open().segments.push(cubicOfQuadratic({ x, y }, { x: n(0), y: n(1) }, { x: n(2), y: n(3) }));
        break;
      case "Z":
      case "z":
        if (current) current.closed = true;
        break;
      default:
        finite = false;
    }
  });
  return finite ? subpaths : null;
}
