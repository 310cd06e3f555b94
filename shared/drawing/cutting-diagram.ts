import type { BarPart, CuttingJob } from "../stock-lengths/cutting-job.ts";
import type { CutBar } from "../stock-lengths/lay-bars.ts";
import type { CuttingPlan } from "../stock-lengths/plan-cutting.ts";
import { formatLength, formatLengthWithUnit } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { drawBarStrip } from "./cutting-bar.ts";
import { fineLineMm } from "./dimensions.ts";
import type { DisplayList, Item } from "./display-list.ts";
import { graphite } from "./palette.ts";
import { textItem } from "./text-item.ts";
import { smallTextMm, textWidthMm, wrapText } from "./type.ts";

export type CuttingDiagram = {
  readonly job: CuttingJob;
  readonly plan: CuttingPlan;
  readonly unit: LengthUnit;
  /** The paper that is free for it, mm. */
  readonly widthMm: number;
  readonly heightMm: number;
  /** Whether a list ends where its bars do, for a screen; else it is as large as the paper. */
  readonly isTrimmed?: boolean;
};

const lineMm = 4.8;
const headMm = 5.6;
/** No strip is drawn narrower, so that a label stands in it. */
const leastStripMm = 6.5;
const mostStripMm = 14;
const betweenBarsMm = 5;
const headingMm = 11;
const titleMm = 4.2;

type Block = { readonly heightMm: number; readonly draw: (y: number) => Item[] };

/**
 * The bars of a plan, one below the other, each with its parts in the order they are cut and what is left; bars cut alike
 * are drawn once. As many lists as it takes, each as large as the paper or, where one bar alone needs more, higher.
 * Prices aren't in it: it hangs by the saw.
 */
export function drawCuttingDiagrams(diagram: CuttingDiagram): DisplayList[] {
  const { plan, widthMm, heightMm, isTrimmed = false } = diagram;
  const heightTo = (y: number) => (isTrimmed ? y - betweenBarsMm : Math.max(heightMm, y - betweenBarsMm));
  const blocks = plan.bars.map((bar, index) => blockOf(diagram, bar, index + 1));
  const pages: DisplayList[] = [];
  let items: Item[] = heading(diagram);
  let y = headingMm;
  for (const block of blocks) {
    if (y > headingMm && y + block.heightMm > heightMm) {
      pages.push({ widthMm, heightMm: heightTo(y), items });
      items = heading(diagram);
      y = headingMm;
    }
    items.push(...block.draw(y));
    y += block.heightMm + betweenBarsMm;
  }
  pages.push({ widthMm, heightMm: heightTo(y), items });
  return pages;
}

/** How many bars of which length, and what the drawing's scale is. */
function heading(diagram: CuttingDiagram): Item[] {
  const { job, plan } = diagram;
  const counts = plan.needed.flatMap(({ stockId, bars }) => {
    const label = job.stock.find(({ id }) => id === stockId)?.label;
    return bars > 0 && label !== undefined ? [`${bars} × ${label}`] : [];
  });
  const scale = `Lengths at 1:${Number(scaleOf(diagram).toFixed(1))}, widths not to scale.`;
  const title = counts.join(", ") || "Nothing to cut";
  const taken = textWidthMm(title, "serif-bold", titleMm) + textWidthMm(scale, "sans", smallTextMm) + 4;
  return [
    textItem(title, { x: 0, y: 4 }, { font: "serif-bold", sizeMm: titleMm }),
    taken <= diagram.widthMm
      ? textItem(scale, { x: diagram.widthMm, y: 4 }, { colour: graphite, align: "right" })
      : textItem(scale, { x: 0, y: 8.8 }, { colour: graphite }),
  ];
}

const scaleOf = ({ job, widthMm }: CuttingDiagram): number =>
  Math.max(...job.stock.map(({ lengthMm }) => lengthMm), widthMm) / (widthMm - fineLineMm);

function blockOf(diagram: CuttingDiagram, bar: CutBar, number: number): Block {
  const { job, unit, widthMm } = diagram;
  const parts = new Map(job.parts.map((part) => [part.id, part]));
  const scale = scaleOf(diagram);
  const stripMm = Math.min(mostStripMm, Math.max(leastStripMm, job.widthMm / scale));
  const label = job.stock.find(({ id }) => id === bar.stockId)?.label ?? "";
  const lines = wrapText(cutOrder(bar, parts, unit), "sans", smallTextMm, widthMm);
  const knots = job.saw.rejectShare > 0 ? ", knots included" : "";
  const left = `left ${formatLengthWithUnit(bar.leftMm, unit)}${knots}`;
  return {
    heightMm: headMm + stripMm + 1.2 + lines.length * lineMm,
    draw: (y) => [
      textItem(`${number}`, { x: 0, y: y + 4 }, { font: "serif-bold" }),
      textItem(bar.times === 1 ? label : `${label}, ${bar.times} cut alike`, { x: 8, y: y + 4 }),
      textItem(left, { x: widthMm, y: y + 4 }, { colour: graphite, align: "right" }),
      {
        kind: "group",
        id: `bar:${number}`,
        x: 0,
        y: 0,
        scale: 1,
        items: drawBarStrip({
          bar,
          parts,
          widthMm: job.widthMm,
          scale,
          at: { x: fineLineMm / 2, y: y + headMm },
          heightMm: stripMm,
          unit,
        }),
      },
      ...lines.map((line, index) =>
        textItem(line, { x: 0, y: y + headMm + stripMm + (index + 1) * lineMm }, { colour: graphite }),
      ),
    ],
  };
}

/** The parts in the order they are cut; neighbours of one length and one setting of the saw share their figures. */
function cutOrder(bar: CutBar, parts: ReadonlyMap<string, BarPart>, unit: LengthUnit): string {
  const runs: { labels: string[]; figures: string }[] = [];
  for (const { partId, label } of bar.places) {
    const part = parts.get(partId);
    if (!part) continue;
    const figures = `${formatLength(part.lengthMm, unit)}, ${sawWords(part)}`;
    const run = runs.at(-1);
    if (run?.figures === figures) run.labels.push(label);
    else runs.push({ labels: [label], figures });
  }
  const text = runs.map(({ labels, figures }) => `${listed(labels)}: ${figures}`).join("; ");
  const squared = bar.squaringMm > 0 ? `Square the end (${formatLength(bar.squaringMm, unit)}), then ` : "";
  return `${squared}${text}.`;
}

/** Labels in a row, equal ones once with their count. */
function listed(labels: readonly string[]): string {
  const counts = new Map<string, number>();
  for (const label of labels) counts.set(label, (counts.get(label) ?? 0) + 1);
  return [...counts].map(([label, count]) => (count > 1 ? `${count} × ${label}` : label)).join(", ");
}

/** How the saw is set: 0 degrees cuts square, so the setting is 90 less the angle between blade and bar. */
function sawWords({ start, end }: BarPart): string {
  const settings = [start, end].map(({ angle }) => Number((90 - angle).toFixed(1)));
  if (settings.every((setting) => setting === 0)) return "square";
  return settings[0] === settings[1] ? `saw ${settings[0]}°` : `saw ${settings[0]}° and ${settings[1]}°`;
}
