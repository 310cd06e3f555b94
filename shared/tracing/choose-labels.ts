import { type Labels, relabelled } from "./label-pixels.ts";
import { colourDistance } from "./merge-colours.ts";
import type { Rgb } from "./picture.ts";
import { colourOfHex, hexOf } from "./picture-colours.ts";
import { pixelAreas } from "./pixel-areas.ts";
import type { TraceChoices } from "./trace-choices.ts";
import type { FoundColour } from "./traced-picture.ts";

/** A colour that fills so much of the rim is the background. */
const rimShare = 0.6;
/** All channels of a white paper are at least this. */
const paperWhite = 232;
/** A colour named in the choices is the found one nearest to it, if it is nearer than this in RGB: another reader may differ a little. */
const sameName = 28;

export type ChosenLabels = {
  readonly labels: Labels;
  /** What makes no piece: the label beyond the colours'. */
  readonly none: number;
  readonly found: readonly FoundColour[];
  /** Whether a background was dropped without being asked. */
  readonly paperDropped: boolean;
};

/** Labels after a maker's choices: colours joined, dropped ones and the transparent as one label that makes no piece. */
export function chooseLabels(labels: Labels, colours: readonly Rgb[], choices: TraceChoices): ChosenLabels {
  const none = colours.length;
  const background = backgroundOf(labels, colours);
  const solid = colours.filter(({ alpha }) => alpha > 0).length;
  const paperDropped =
    choices.background === "automatic" && background !== null && solid > 1 && isPaper(colours[background]);
  const named = (hex: string): number => nearestColour(colours, hex);
  const into = colours.map((_, label) => label);
  for (const { from, into: target } of choices.joined) {
    const [a, b] = [named(from), named(target)];
    if (a < 0 || b < 0 || into[a] === into[b]) continue;
    const gone = into[a];
    for (const [label, at] of into.entries()) if (at === gone) into[label] = into[b] ?? at;
  }
  const dropped = new Set(choices.dropped.map(named).filter((label) => label >= 0));
  if (background !== null && (paperDropped || choices.background === "everywhere")) dropped.add(background);
  const become = colours.map(({ alpha }, label) => (alpha === 0 || dropped.has(label) ? none : (into[label] ?? label)));
  // What is joined to a dropped colour goes with it.
  const settled = become.map((label) => become[label] ?? label);
  const chosen = relabelled(labels, settled);
  const rimLabel = background === null ? none : (settled[background] ?? none);
  const around = choices.background === "around" && rimLabel !== none;
  const counts = countsOf(labels.first, colours.length);
  return {
    labels: around ? withoutRimAreas(chosen, rimLabel, none) : chosen,
    none,
    paperDropped,
    found: colours.flatMap((colour, label) =>
      colour.alpha === 0
        ? []
        : {
            colour: hexOf(colour),
            share: (counts[label] ?? 0) / labels.first.length,
            fillsRim: label === background,
            became: settled[label] === none ? "dropped" : settled[label] === label ? "pieces" : "joined",
          },
    ),
  };
}

/** The colour that fills the rim; null where the picture is transparent there, or nothing fills it. */
function backgroundOf({ width, height, first }: Labels, colours: readonly Rgb[]): number | null {
  const rim: number[] = [];
  for (let x = 0; x < width; x++) rim.push(first[x] ?? 0, first[(height - 1) * width + x] ?? 0);
  for (let y = 0; y < height; y++) rim.push(first[y * width] ?? 0, first[y * width + width - 1] ?? 0);
  const counts = countsOf(rim, colours.length);
  const best = counts.indexOf(Math.max(...counts));
  return (counts[best] ?? 0) >= rimShare * rim.length && (colours[best]?.alpha ?? 0) > 0 ? best : null;
}

const isPaper = (colour: Rgb | undefined): boolean =>
  colour !== undefined && Math.min(colour.red, colour.green, colour.blue) >= paperWhite;

function nearestColour(colours: readonly Rgb[], hex: string): number {
  const wanted = colourOfHex(hex);
  if (!wanted) return -1;
  let nearest = -1;
  let least = sameName;
  for (const [label, colour] of colours.entries()) {
    if (colour.alpha === 0) continue;
    const shown = colourOfHex(hexOf(colour));
    const away = shown ? colourDistance(shown, wanted) : least;
    if (away < least) [nearest, least] = [label, away];
  }
  return nearest;
}

/** Areas of the background that reach the rim make no piece; those enclosed by other colours stay. */
function withoutRimAreas(labels: Labels, background: number, none: number): Labels {
  const { width, height } = labels;
  const { of, areas } = pixelAreas(labels);
  const onRim = new Set<number>();
  const visit = (pixel: number): void => {
    const area = of[pixel] ?? 0;
    if (areas[area]?.label === background) onRim.add(area);
  };
  for (let x = 0; x < width; x++) [x, (height - 1) * width + x].forEach(visit);
  for (let y = 0; y < height; y++) [y * width, y * width + width - 1].forEach(visit);
  const first = labels.first.map((label, pixel) => (onRim.has(of[pixel] ?? -1) ? none : label));
  const second = labels.second.map((label, pixel) => {
    if (label !== background) return first[pixel] === none && labels.first[pixel] === label ? none : label;
    const x = pixel % width;
    const beside = [
      pixel,
      x > 0 ? pixel - 1 : pixel,
      x < width - 1 ? pixel + 1 : pixel,
      Math.max(pixel - width, x),
      Math.min(pixel + width, (height - 1) * width + x),
    ];
    return beside.some((other) => first[other] === none) ? none : label;
  });
  return { ...labels, first, second };
}

function countsOf(labels: Uint8Array | readonly number[], colours: number): number[] {
  const counts = new Array<number>(colours).fill(0);
  for (const label of labels) counts[label] = (counts[label] ?? 0) + 1;
  return counts;
}
