import type { Banded } from "../units/banded.ts";
import { formatBandEnds } from "../units/format-band.ts";
import { formatLength } from "../units/format-length.ts";
import { balloonRadiusMm, drawBalloon, drawLeader } from "./balloon.ts";
import type { Item } from "./display-list.ts";
import { graphite } from "./palette.ts";
import type { SectionInput, Slab } from "./section-bodies.ts";
import { textItem } from "./text-item.ts";
import { capHeightShare, smallTextMm, textWidthMm } from "./type.ts";

/** Moves places that want to be nearer than `pitch` apart, keeping their order and staying near where they were, none below `least`. */
export function spreadPlaces(
  wanted: readonly number[],
  { pitch, least }: { readonly pitch: number; readonly least: number },
): number[] {
  const places: number[] = [];
  for (const place of wanted) places.push(Math.max(place, (places.at(-1) ?? Number.NEGATIVE_INFINITY) + pitch));
  const shift =
    places.reduce((sum, place, index) => sum + place - (wanted[index] ?? place), 0) / Math.max(1, places.length);
  return places.map((place) => place - Math.min(shift, (places[0] ?? 0) - least));
}

const labelPitchMm = 7;
/** Two lines a label. */
const bandedPitchMm = 8.5;
/** The first label stays this far below the board's upper edge: its heading must not rise into the dimensions. */
const leastLabelMm = 3;
/** Where on a layer's height its leader may end, the best first. */
const footShares = [0.5, 0.25, 0.75, 0.1, 0.9, 0.4, 0.6];
const labelTitle = "Top at";

type Label = {
  readonly key: string;
  readonly text: string;
  /** The band, on a line of its own below; "" without one. */
  readonly band: string;
  readonly foot: { readonly x: number; readonly y: number };
};

function labelsOf(input: SectionInput, slabs: readonly Slab[]): Label[] {
  const { document, figures, unit, depthScale, heights = "nominal" } = input;
  const top = (band: Banded) => ({
    text: formatLength(band.nominal, unit),
    band: heights === "nominal" ? "" : formatBandEnds(band, unit),
  });
  const backer: Label = {
    key: "A",
    ...top(figures.backerTop),
    foot: {
      x: figures.backerTop.nominal * depthScale * 0.5,
      y: document.board.height - Math.min(8 * input.paperScale, document.board.height * 0.06),
    },
  };
  const feet: number[] = [];
  const layers = figures.layers.flatMap((layer): Label[] => {
    const slab = slabs
      .filter(({ key }) => key === layer.key)
      .sort((a, b) => b.box.x + b.box.width - a.box.x - a.box.width)[0]?.box;
    if (!slab) return [];
    // Leaders to layers of one middle would run into one point.
    const heights = footShares.map((share) => slab.y + slab.height * share);
    const clear = heights.find((y) => feet.every((foot) => Math.abs(foot - y) > 2.5 * input.paperScale));
    const y = clear ?? slab.y + slab.height / 2;
    feet.push(y);
    return [{ key: layer.key, ...top(layer.top), foot: { x: slab.x + slab.width * 0.6, y } }];
  });
  return [...layers, backer].sort((a, b) => a.foot.y - b.foot.y || (a.key < b.key ? -1 : 1));
}

/** Keys and tops in a column before the stack, each with a leader to its part; and how far the column reaches, in mm of the sign. */
export function layLabels(
  input: SectionInput,
  slabs: readonly Slab[],
): { items: Item[]; right: number; bottom: number } {
  const { figures, paperScale, depthScale } = input;
  const mm = (paper: number) => paper * paperScale;
  const labels = labelsOf(input, slabs);
  const places = spreadPlaces(
    labels.map(({ foot }) => foot.y),
    { pitch: mm(labels.some(({ band }) => band !== "") ? bandedPitchMm : labelPitchMm), least: mm(leastLabelMm) },
  );
  const balloonX = figures.depth.nominal * depthScale + mm(9);
  const left = balloonX - mm(balloonRadiusMm);
  const textX = balloonX + mm(4.4);
  const sizeMm = mm(smallTextMm);
  const keys = labels.flatMap(({ key, text, band, foot }, index): Item[] => {
    const y = places[index] ?? foot.y;
    const line = y + (sizeMm * capHeightShare) / 2;
    const apart = band === "" ? 0 : sizeMm * 0.55;
    return [
      ...drawLeader([foot, { x: left, y }], paperScale),
      ...drawBalloon(key, { x: balloonX, y }, paperScale),
      textItem(text, { x: textX, y: line - apart }, { sizeMm }),
      ...(band === "" ? [] : [textItem(band, { x: textX, y: line + apart }, { sizeMm, colour: graphite })]),
    ];
  });
  const title = textItem(labelTitle, { x: left, y: (places[0] ?? 0) - mm(5.4) }, { sizeMm, colour: graphite });
  const widths = labels
    .flatMap(({ text, band }) => [text, band])
    .map((line) => textX + textWidthMm(line, "sans", sizeMm) + mm(1));
  return {
    items: [...keys, title],
    right: Math.max(...widths, left + textWidthMm(labelTitle, "sans", sizeMm) + mm(1)),
    bottom: (places.at(-1) ?? 0) + mm(2),
  };
}
