import type { Kernel } from "../geometry/kernel.ts";
import type { MockupDocument, Wood } from "../mockup/document.ts";
import type { SlatCut } from "../slats/slat-layout.ts";
import { frameOf, slatsOf } from "../stack/backer.ts";

/** What is cut from one section of wood, mm: lengths from long point to long point, and how far the saw cuts through. */
export type StripMeasure = {
  readonly stock: Wood;
  readonly widthMm: number;
  readonly thicknessMm: number;
  readonly lengthMm: number;
  readonly pieces: number;
  readonly cutMm: number;
  /** Settings of the saw that its cuts need, each once. */
  readonly settings: number;
};

type Part = { readonly lengthMm: number; readonly settings: readonly number[] };

/** Slats, spine and frame of one sign by section; what can't be laid is left out. */
export function measureStrips(
  document: MockupDocument,
  kernel: Kernel,
): { readonly strips: StripMeasure[]; readonly framePieces: number } {
  const { backer, frame } = document;
  const laid = slatsOf(document, kernel);
  const round = frameOf(document, kernel);
  const strips: StripMeasure[] = [];
  const add = (stock: Wood, widthMm: number, thicknessMm: number, parts: readonly Part[]) => {
    const settings = parts.flatMap((part) => part.settings);
    // Along a slat's own edge no cut is longer than the slat.
    const across = (setting: number, lengthMm: number) =>
      Math.min(widthMm / Math.cos((setting * Math.PI) / 180), Math.hypot(lengthMm, widthMm));
    strips.push({
      stock,
      widthMm,
      thicknessMm,
      lengthMm: parts.reduce((sum, { lengthMm }) => sum + lengthMm, 0),
      pieces: parts.length,
      cutMm: parts.reduce(
        (sum, part) => part.settings.reduce((all, setting) => all + across(setting, part.lengthMm), sum),
        0,
      ),
      settings: new Set(settings.map((setting) => setting.toFixed(1))).size,
    });
  };
  if (backer.slats && laid?.ok) {
    const { stock, thickness, slatWidth, spineWidth } = backer.slats;
    const { slats, spine } = laid.value;
    const parts = slats.map(({ longPoint, near, far }) => ({
      lengthMm: longPoint,
      settings: [steepest(near), steepest(far)],
    }));
    const spines = spine ? [{ lengthMm: spine.length, settings: [0, 0] }] : [];
    if (spineWidth === slatWidth) add(stock, slatWidth, thickness, [...parts, ...spines]);
    else {
      add(stock, slatWidth, thickness, parts);
      if (spine) add(stock, spineWidth, thickness, spines);
    }
  }
  const members = frame && round?.ok ? round.value.members : [];
  if (frame && members.length > 0) {
    const parts = members.map(({ longPoint, settings }) => ({ lengthMm: longPoint, settings }));
    add(frame.stock, frame.width, frame.depth, parts);
  }
  return { strips, framePieces: members.length };
}

/** An end with two cuts is reckoned as one cut across, along the steeper. */
const steepest = (cuts: readonly SlatCut[]): number => cuts.reduce((most, { setting }) => Math.max(most, setting), 0);
