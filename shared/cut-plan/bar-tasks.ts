import type { Kernel } from "../geometry/kernel.ts";
import type { MockupDocument, Wood } from "../mockup/document.ts";
import { frameOf, slatsOf } from "../stack/backer.ts";
import { type BarEnd, type BarPart, type CuttingJob, squareEnd } from "../stock-lengths/cutting-job.ts";
import { partsOfSlats } from "../stock-lengths/parts-of-slats.ts";
import { formatLength, formatLengthWithUnit } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { ShopSaws } from "./shop-saws.ts";

/** Everything that is cut from bars of one wood and one section. */
export type BarTask = {
  readonly id: string;
  readonly title: string;
  readonly stock: Wood;
  readonly widthMm: number;
  readonly thicknessMm: number;
  readonly job: CuttingJob;
};

/** What has to be cut from stock lengths: slats, spine, frame. What can't be laid asks for nothing; the dry fit says so. */
export function barTasks({
  document,
  saws,
  unit,
  kernel,
}: {
  readonly document: MockupDocument;
  readonly saws: ShopSaws;
  readonly unit: LengthUnit;
  readonly kernel: Kernel;
}): BarTask[] {
  const { backer, frame, quantity } = document;
  const laid = slatsOf(document, kernel);
  const round = frameOf(document, kernel);
  const tasks: Section[] = [];
  if (backer.slats && laid?.ok) {
    const { stock, thickness, slatWidth, spineWidth } = backer.slats;
    const parts = partsOfSlats(laid.value.slats).map((part) => ({ ...part, quantity }));
    tasks.push({ what: "Slats", stock, width: slatWidth, thickness, parts });
    const { spine } = laid.value;
    if (spine) {
      const part = { id: "spine", label: "S", lengthMm: spine.length, quantity, start: squareEnd, end: squareEnd };
      tasks.push({ what: "Spine", stock, width: spineWidth, thickness, parts: [part] });
    }
  }
  if (frame && round?.ok) {
    const parts = round.value.members.map(({ longPoint, settings }, index): BarPart => {
      const [start, end] = settings.map((setting): BarEnd => ({ angle: 90 - setting, longPoint: "upper" }));
      return {
        id: `frame-${index + 1}`,
        label: `F${index + 1}`,
        lengthMm: longPoint,
        quantity,
        start: start ?? squareEnd,
        end: end ?? squareEnd,
      };
    });
    tasks.push({ what: "Frame", stock: frame.stock, width: frame.width, thickness: frame.depth, parts });
  }
  return bySection(tasks).map(({ what, stock, width, thickness, parts }) => ({
    id: what.toLowerCase(),
    title: `${what}: ${stock.name}, ${formatLength(width, unit)} × ${formatLength(thickness, unit)}${unit === "mm" ? " mm" : ""}`,
    stock,
    widthMm: width,
    thicknessMm: thickness,
    job: {
      parts,
      stock: [
        {
          id: "usual",
          label: `${formatLengthWithUnit(saws.barLengthMm, unit)} bar`,
          lengthMm: saws.barLengthMm,
          price: null,
          onHand: null,
        },
      ],
      widthMm: width,
      saw: { kerfMm: saws.sawKerfMm, squaringMm: saws.squaringMm, rejectShare: saws.rejectShare, nests: true },
    },
  }));
}

type Section = {
  readonly what: string;
  readonly stock: Wood;
  readonly width: number;
  readonly thickness: number;
  readonly parts: readonly BarPart[];
};

/** What has one wood and one section is cut from the same bars, so that a spine comes out of what slats leave. */
function bySection(all: readonly Section[]): Section[] {
  const merged = new Map<string, Section>();
  for (const section of all) {
    const key = JSON.stringify([section.stock, section.width, section.thickness]);
    const before = merged.get(key);
    const what = `${before?.what} and ${section.what.toLowerCase()}`;
    merged.set(key, before ? { ...before, what, parts: [...before.parts, ...section.parts] } : section);
  }
  return [...merged.values()];
}
