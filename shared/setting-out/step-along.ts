/** What a thing takes of a line, mm from where the line is measured; `from` is not over `to`. */
export type Stretch = { readonly from: number; readonly to: number };

/** `equal gaps` and `equal pitch` lie between the first and the last, which stay. */
export type SpacingAlong =
  | { readonly kind: "pitch" | "gap"; readonly mm: number }
  | { readonly kind: "equal gaps" | "equal pitch" };

/** `over` divides a length, at whose end the last copy comes to lie. */
export type SpacingOfCopies = { readonly kind: "pitch" | "gap" | "over"; readonly mm: number };

const middleOf = ({ from, to }: Stretch): number => (from + to) / 2;

/**
 * How far each thing goes along a line, mm, in the order given: they keep the order that their middles have on the line
 * and the first on it stays. Pitch is from middle to middle, a gap from edge to edge; where things are wider than the
 * room for equal gaps, the gap is negative.
 */
export function stepsAlong(stretches: readonly Stretch[], spacing: SpacingAlong): number[] {
  const onLine = stretches
    .map((stretch, index) => ({ stretch, index }))
    .sort((a, b) => middleOf(a.stretch) - middleOf(b.stretch) || a.index - b.index);
  const [first] = onLine;
  const last = onLine.at(-1);
  const steps = stretches.map(() => 0);
  if (!first || !last || onLine.length < 2) return steps;
  const spaces = onLine.length - 1;
  const taken = onLine.reduce((sum, { stretch }) => sum + (stretch.to - stretch.from), 0);

  if (spacing.kind === "pitch" || spacing.kind === "equal pitch") {
    const start = middleOf(first.stretch);
    const pitch = spacing.kind === "pitch" ? spacing.mm : (middleOf(last.stretch) - start) / spaces;
    for (const [place, { stretch, index }] of onLine.entries())
      steps[index] = place === 0 ? 0 : start + place * pitch - middleOf(stretch);
    return steps;
  }
  const gap = spacing.kind === "gap" ? spacing.mm : (last.stretch.to - first.stretch.from - taken) / spaces;
  let from = first.stretch.from;
  for (const { stretch, index } of onLine) {
    steps[index] = from - stretch.from;
    from += stretch.to - stretch.from + gap;
  }
  return steps;
}

/** How far each of `count` copies of a thing that takes `length` of a line goes along it, mm. */
export function stepsOfCopies(length: number, count: number, { kind, mm }: SpacingOfCopies): number[] {
  const pitch = kind === "gap" ? length + mm : kind === "over" ? mm / count : mm;
  return Array.from({ length: count }, (_, index) => (index + 1) * pitch);
}
