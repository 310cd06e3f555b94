import { type CuttingJob, hasParallelCuts } from "#shared/stock-lengths/cutting-job.ts";

type Bar = { readonly stock: number; readonly parts: number[] };

/**
 * The least cost of a small job by trying every way there is: each piece into every bar opened so far and into a new one
 * of each length. Cost by `costOf` a bar; null when the bars on hand don't suffice. Up to seven pieces or so.
 */
export function tryAllCuts(job: CuttingJob, costOf: (stock: number) => number): number | null {
  const pieces = job.parts.flatMap((part, index) => Array.from({ length: part.quantity }, () => index));
  let least: number | null = null;
  const bars: Bar[] = [];
  const fits = ({ stock, parts }: Bar) => {
    const { lengthMm = 0 } = job.stock[stock] ?? {};
    return reachMm(job, parts) <= lengthMm * (1 - job.saw.rejectShare) - job.saw.squaringMm + 1e-6;
  };
  const place = (at: number, cost: number): void => {
    if (least !== null && cost >= least) return;
    const piece = pieces[at];
    if (piece === undefined) {
      least = cost;
      return;
    }
    for (const bar of bars) {
      bar.parts.push(piece);
      if (fits(bar)) place(at + 1, cost);
      bar.parts.pop();
    }
    for (const [stock, { onHand }] of job.stock.entries()) {
      if (onHand !== null && bars.filter((bar) => bar.stock === stock).length >= onHand) continue;
      const bar = { stock, parts: [piece] };
      bars.push(bar);
      if (fits(bar)) place(at + 1, cost + costOf(stock));
      bars.pop();
    }
  };
  place(0, 0);
  return least;
}

/** How far parts of one saw angle reach along a bar, the last cut left out; those of one hand lie in each other where that is allowed. */
function reachMm({ parts, saw, widthMm }: CuttingJob, onBar: readonly number[]): number {
  let reach = 0;
  let kerf = 0;
  const hands = new Set<string>();
  for (const index of onBar) {
    const part = parts[index];
    if (!part) continue;
    const angle = (Math.min(part.start.angle, part.end.angle) * Math.PI) / 180;
    const run = widthMm / Math.tan(angle);
    const isNested = saw.nests && hasParallelCuts(part) && part.lengthMm > run + 1e-6;
    if (isNested && !hands.has(part.start.longPoint)) reach += run;
    if (isNested) hands.add(part.start.longPoint);
    kerf = saw.kerfMm / Math.sin(angle);
    reach += part.lengthMm - (isNested ? run : 0) + kerf;
  }
  return reach - kerf;
}
