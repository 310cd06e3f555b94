import type { Path, Point, Ring, Segment } from "../geometry/path.ts";
import { type Heading, headings, outside, turned } from "./edge-walk.ts";
import { type EdgeEnd, type EdgeFit, fitEdge } from "./fit-edge.ts";
import type { Labels } from "./label-pixels.ts";
import type { PixelAreas } from "./pixel-areas.ts";
import { endKey, placeJunctions } from "./place-junctions.ts";
import { type Edge, reversedEdge, traceEdges } from "./trace-edges.ts";

type Half = { readonly edge: Edge; readonly ring: Ring };

/**
 * The outline of every area, by its number, in pixels: its outer ring and its holes, read by the even-odd rule. Borders are fitted once, so
 * that neighbours share them.
 */
export function outlineAreas(labels: Labels, areas: PixelAreas, fit: EdgeFit): ReadonlyMap<number, Path> {
  const traced = traceEdges(labels);
  const junctions = placeJunctions(traced);
  const halves = new Map<string, Half>();
  const outlines = new Map<number, Ring[]>();
  const areaOf = (pixel: number): number => (pixel === outside ? outside : (areas.of[pixel] ?? outside));
  const keep = (area: number, ring: Ring): void => {
    if (area === outside) return;
    const rings = outlines.get(area);
    if (rings) rings.push(ring);
    else outlines.set(area, [ring]);
  };
  const endOf = (corner: number, heading: Heading): EdgeEnd => {
    const junction = junctions.get(corner);
    if (!junction) throw new Error("An edge ends where no junction is.");
    return { at: junction.at, direction: junction.through.get(endKey(corner, heading)) ?? null };
  };
  for (const edge of traced.edges) {
    if (edge.from === null || edge.to === null) {
      const ring = fitEdge(edge.points, null, fit);
      keep(areaOf(edge.right), ring);
      keep(areaOf(edge.left), ring);
      continue;
    }
    const from = endOf(edge.from, edge.leaving);
    const to = endOf(edge.to, turned(edge.arriving, 2));
    const ring = fitEdge(edge.points, { from, to }, fit);
    halves.set(endKey(edge.from, edge.leaving), { edge, ring });
    halves.set(endKey(edge.to, turned(edge.arriving, 2)), { edge: reversedEdge(edge), ring: reversedRing(ring) });
  }
  const used = new Set<string>();
  for (const [key, { edge, ring }] of halves) {
    if (used.has(key)) continue;
    used.add(key);
    const segments: Segment[] = [...ring.segments];
    for (let at = edge; ; ) {
      const next = nextKey(traced.grid, at);
      const half = halves.get(next);
      if (next === key || !half || used.has(next)) break;
      used.add(next);
      segments.push(...half.ring.segments);
      at = half.edge;
    }
    keep(areaOf(edge.right), { start: ring.start, segments });
  }
  return outlines;
}

/** The edge that goes on with the same area on its right: the first to the right, else straight on, else to the left. */
function nextKey(grid: ReturnType<typeof traceEdges>["grid"], { to, arriving }: Edge): string {
  const corner = to ?? 0;
  const onward = [turned(arriving, 1), arriving, turned(arriving, 3)].find((heading) => grid.hasEdge(corner, heading));
  return endKey(corner, onward ?? headings[0] ?? 0);
}

function reversedRing({ start, segments }: Ring): Ring {
  const starts: Point[] = [start, ...segments.map(({ to }) => to)];
  const back = segments.map((segment, index): Segment => {
    const to = starts[index] ?? start;
    return segment.kind === "line" ? { kind: "line", to } : { kind: "cubic", c1: segment.c2, c2: segment.c1, to };
  });
  return { start: starts.at(-1) ?? start, segments: back.toReversed() };
}
