import type { CuttingJob } from "#shared/stock-lengths/cutting-job.ts";
import type { CutBar } from "#shared/stock-lengths/lay-bars.ts";
import type { CuttingPlan } from "#shared/stock-lengths/plan-cutting.ts";

const hair = 2e-6;
const tangent = (degrees: number) => (degrees === 90 ? Number.POSITIVE_INFINITY : Math.tan((degrees * Math.PI) / 180));

/**
 * What is wrong with a plan, worked out from the job and the places of the parts alone, nothing of the search: every part
 * cut as often as asked, every part inside its bar, the blade's way free between neighbours along both edges, no more
 * bars than there are, sums that agree.
 */
export function faultsOfPlan(job: CuttingJob, plan: CuttingPlan): string[] {
  const cut = new Map<string, number>();
  for (const { places, times } of plan.bars)
    for (const { partId } of places) cut.set(partId, (cut.get(partId) ?? 0) + times);
  const faults: string[] = [];
  for (const { id, quantity } of job.parts)
    if (cut.get(id) !== quantity) faults.push(`${id} is cut ${cut.get(id) ?? 0} times, not ${quantity}`);
  if (cut.size !== job.parts.length) faults.push(`${cut.size} parts cut of ${job.parts.length}`);
  for (const bar of plan.bars) faults.push(...faultsOfBar(job, bar));
  let barsMm = 0;
  let price = 0;
  for (const stock of job.stock) {
    const count = plan.bars.reduce((sum, { stockId, times }) => sum + (stockId === stock.id ? times : 0), 0);
    barsMm += count * stock.lengthMm;
    price += count * (stock.price ?? 0);
    if (count > (stock.onHand ?? count)) faults.push(`${count} bars of ${stock.id}, ${stock.onHand} on hand`);
    if (plan.needed.find(({ stockId }) => stockId === stock.id)?.bars !== count) faults.push(`needed of ${stock.id}`);
  }
  const cost = { bars: plan.barCount, length: barsMm, price }[plan.costKind];
  if (Math.abs(plan.cost - cost) > 0.001) faults.push(`costs ${cost}, not ${plan.cost}`);
  if (plan.leastCost > plan.cost) faults.push(`costs ${plan.cost}, less than the least, ${plan.leastCost}`);
  if (plan.ended === "proved" && plan.gap !== 0) faults.push("proved with a gap");
  return faults;
}

function faultsOfBar({ parts, saw, stock, widthMm }: CuttingJob, bar: CutBar): string[] {
  const faults: string[] = [];
  const length = stock.find(({ id }) => id === bar.stockId)?.lengthMm ?? 0;
  let [upper, lower] = [0, 0];
  let taken = 0;
  for (const [index, { partId, fromMm, toMm }] of bar.places.entries()) {
    const part = parts.find(({ id }) => id === partId);
    if (!part) return [`no part ${partId}`];
    if (Math.abs(toMm - fromMm - part.lengthMm) > hair) faults.push(`${partId} is ${toMm - fromMm} long`);
    const startRun = widthMm / tangent(part.start.angle);
    const endRun = widthMm / tangent(part.end.angle);
    const from = {
      upper: fromMm + (part.start.longPoint !== "lower" ? 0 : startRun),
      lower: fromMm + (part.start.longPoint !== "upper" ? 0 : startRun),
    };
    const before = parts.find(({ id }) => id === bar.places[index - 1]?.partId);
    const gap = before ? Math.min(from.upper - upper, from.lower - lower) : fromMm;
    const needed = before
      ? saw.kerfMm / Math.sin((Math.min(before.start.angle, before.end.angle) * Math.PI) / 180)
      : saw.squaringMm;
    if (gap < needed - hair) faults.push(`${gap} before ${partId}, ${needed} needed`);
    upper = toMm - (part.end.longPoint !== "lower" ? 0 : endRun);
    lower = toMm - (part.end.longPoint !== "upper" ? 0 : endRun);
    taken = Math.max(taken, upper, lower);
  }
  const usable = length * (1 - saw.rejectShare);
  if (taken > usable + hair) faults.push(`${taken} on a bar that gives ${usable}`);
  return faults;
}
