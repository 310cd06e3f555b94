import type { Path, Point } from "../geometry/path.ts";

/** A millimetre figure as SVG writes it, to a thousandth: the kernel's own grid, finer than any machine. */
export function mmText(value: number): string {
  const rounded = Math.round(value * 1000) / 1000;
  return String(rounded === 0 ? 0 : rounded);
}

const pair = ({ x, y }: Point) => `${mmText(x)} ${mmText(y)}`;

/** Closed rings as SVG path data with absolute M, L, C and Z only. */
export function pathData(path: Path): string {
  return path
    .map((ring) => {
      const steps = ring.segments.map((segment) =>
        segment.kind === "line"
          ? `L${pair(segment.to)}`
          : `C${pair(segment.c1)} ${pair(segment.c2)} ${pair(segment.to)}`,
      );
      return `M${pair(ring.start)}${steps.join("")}Z`;
    })
    .join("");
}

/** An open line as SVG path data. */
export function lineData(points: readonly Point[]): string {
  return points.map((point, index) => `${index === 0 ? "M" : "L"}${pair(point)}`).join("");
}
