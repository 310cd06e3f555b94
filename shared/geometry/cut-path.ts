import { cubicRootsOnLine, cubicSplit } from "./cut-cubic.ts";
import type { Path, Point, Ring, Segment } from "./path.ts";

/** A straight line through a point; `along` has length 1. */
export type CutLine = { readonly through: Point; readonly along: Point };

/** What of a path lies on the line's left and right, seen along it on the sheet. */
export type CutPath = { readonly left: Path; readonly right: Path };

/** A node nearer to the line than this lies on it, mm: which side it belongs to would be chance. */
const onLineMm = 1e-6;

/** A stretch of a ring on one side of the line, from one crossing to the next. */
type Run = {
  readonly start: number;
  readonly end: number;
  readonly side: number;
  readonly from: Point;
  readonly segments: readonly Segment[];
};
/** Where an outline crosses the line, and how far along it. */
type Crossing = { readonly at: number; readonly point: Point };

/**
 * Cuts a path along a straight line. Curves stay curves: each is divided where it crosses, and the parts are closed along the
 * line, by the even-odd rule like the path. Null when a node lies on the line; then a line beside it does.
 */
export function cutPath(path: Path, line: CutLine): CutPath | null {
  const nodes = path.flatMap(({ start, segments }) => [start, ...segments.map(({ to }) => to)]);
  if (nodes.some((node) => Math.abs(sideMm(node, line)) <= onLineMm)) return null;
  const crossings: Crossing[] = [];
  const runs: Run[] = [];
  const whole: { readonly side: number; readonly ring: Ring }[] = [];
  for (const ring of path) {
    const own = runsOf(ring, line, crossings);
    if (own.length === 0) whole.push({ side: Math.sign(sideMm(ring.start, line)), ring });
    runs.push(...own);
  }
  const partners = partnersOf(crossings);
  const sideOf = (side: number): Path => [
    ...whole.filter((one) => one.side === side).map(({ ring }) => ring),
    ...joined(
      runs.filter((run) => run.side === side),
      crossings,
      partners,
    ),
  ];
  return { left: sideOf(-1), right: sideOf(1) };
}

/** How far right of the line a point lies, seen along it on the sheet (y down). */
const sideMm = ({ x, y }: Point, { through, along }: CutLine): number =>
  (y - through.y) * along.x - (x - through.x) * along.y;

/** The runs of one ring, whose crossings are added to the others'; none when it stays on its side. */
function runsOf(ring: Ring, line: CutLine, crossings: Crossing[]): Run[] {
  type Part = { readonly from: Point; readonly segment: Segment; readonly crosses: boolean };
  const parts: Part[] = [];
  let from = ring.start;
  const last = ring.segments.at(-1)?.to ?? ring.start;
  const isClosed = last.x === ring.start.x && last.y === ring.start.y;
  const closing: Segment[] = isClosed ? [] : [{ kind: "line", to: ring.start }];
  for (const segment of [...ring.segments, ...closing]) {
    const pieces = divided(from, segment, line);
    for (const [index, piece] of pieces.entries()) {
      parts.push({ from, segment: piece, crosses: index < pieces.length - 1 });
      from = piece.to;
    }
  }
  const first = parts.findIndex(({ crosses }) => crosses);
  if (first < 0) return [];
  const turned = [...parts.slice(first + 1), ...parts.slice(0, first + 1)];
  const known = crossings.length;
  let side = -Math.sign(sideMm(ring.start, line));
  const runs: Run[] = [];
  let open: Part[] = [];
  for (const part of turned) {
    open.push(part);
    if (!part.crosses) continue;
    const begins = open[0]?.from ?? part.from;
    const start = crossings.push(crossingAt(begins, line)) - 1;
    runs.push({ start, end: start + 1, side, from: begins, segments: open.map(({ segment }) => segment) });
    side = -side;
    open = [];
  }
  // The last run ends where the first begins.
  return runs.map((run, index) => (index === runs.length - 1 ? { ...run, end: known } : run));
}

function crossingAt(point: Point, { through, along }: CutLine): Crossing {
  return { point, at: (point.x - through.x) * along.x + (point.y - through.y) * along.y };
}

/** A segment in parts that lie on one side each. */
function divided(from: Point, segment: Segment, line: CutLine): Segment[] {
  if (segment.kind === "line") {
    const [a, b] = [sideMm(from, line), sideMm(segment.to, line)];
    if (a > 0 === b > 0) return [segment];
    const share = a / (a - b);
    const to = { x: from.x + share * (segment.to.x - from.x), y: from.y + share * (segment.to.y - from.y) };
    return [{ kind: "line", to }, segment];
  }
  const { c1, c2, to } = segment;
  const roots = cubicRootsOnLine([from, c1, c2, to].map((point) => sideMm(point, line)));
  return roots.length === 0 ? [segment] : cubicSplit(from, segment, roots);
}

/** Along the line inside and outside change at every crossing: which two close a stretch of it that is inside. */
function partnersOf(crossings: readonly Crossing[]): ReadonlyMap<number, number> {
  const sorted = crossings.map(({ at }, index) => ({ at, index })).toSorted((a, b) => a.at - b.at || a.index - b.index);
  const partners = new Map<number, number>();
  for (let index = 0; index + 1 < sorted.length; index += 2) {
    const [one, other] = [sorted[index]?.index ?? 0, sorted[index + 1]?.index ?? 0];
    partners.set(one, other);
    partners.set(other, one);
  }
  return partners;
}

/** Rings out of one side's runs, from run to run along the line. */
function joined(runs: readonly Run[], crossings: readonly Crossing[], partners: ReadonlyMap<number, number>): Ring[] {
  const ending = new Map(runs.flatMap((run) => [[run.start, run] as const, [run.end, run] as const]));
  const used = new Set<Run>();
  const rings: Ring[] = [];
  for (const first of runs) {
    if (used.has(first)) continue;
    const segments: Segment[] = [];
    let run: Run | undefined = first;
    let at = first.start;
    while (run && !used.has(run)) {
      used.add(run);
      segments.push(...(at === run.start ? run.segments : reversed(run)));
      const next = partners.get(at === run.start ? run.end : run.start);
      const point = next === undefined ? undefined : crossings[next]?.point;
      if (next === undefined || !point) break;
      segments.push({ kind: "line", to: point });
      at = next;
      run = ending.get(next);
    }
    rings.push({ start: first.from, segments });
  }
  return rings;
}

function reversed({ from, segments }: Run): Segment[] {
  const points = [from, ...segments.map(({ to }) => to)];
  return segments
    .map((segment, index): Segment => {
      const to = points[index] ?? from;
      return segment.kind === "line" ? { kind: "line", to } : { kind: "cubic", c1: segment.c2, c2: segment.c1, to };
    })
    .toReversed();
}
