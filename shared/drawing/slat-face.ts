import { boxOfRegion } from "../geometry/box.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Box, Path } from "../geometry/path.ts";
import { pathOfRegion } from "../geometry/path-of-region.ts";
import { pathTransform, translateMatrix } from "../geometry/transform.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { SlatLayout } from "../slats/slat-layout.ts";
import { faceRegion, faceStock } from "../stack/backer.ts";
import type { Colour, Item } from "./display-list.ts";
import { faceColour } from "./face-colour.ts";
import { type GrainSample, grainAlikeness, grainSample } from "./grain-alikeness.ts";
import { shadowDirection, shadowOffsetMm } from "./light.ts";
import { latticeValue, seedOfText } from "./noise.ts";
import { mixColours } from "./palette.ts";
import { boardStrength, shadowColour } from "./shadow.ts";
import { type GrainStrip, stripGrain } from "./strip-grain.ts";
import { tonesOfRow } from "./strip-tones.ts";

const sideNumbers = { left: 1, right: 2, whole: 3 } as const;

/** The spine is a plank like the others, a little darker than most, so that it leads the eye. */
const spineTone = 2;

/** Slats and spine as strips of grain: neighbours differ in tone, and no two are cut from the same stretch of wood. */
export function stripsOfSlats({ design, slats, spine }: SlatLayout, woodName: string): GrainStrip[] {
  const start = seedOfText(woodName);
  const seedOf = (side: keyof typeof sideNumbers, number: number) =>
    Math.floor(latticeValue(start + number, sideNumbers[side], 29) * 1_000_000);
  const tones = new Map<string, number>();
  for (const side of ["left", "right", "whole"] as const) {
    const strips = [...new Set(slats.filter((slat) => slat.side === side).map(({ strip }) => strip))].sort(
      (a, b) => a - b,
    );
    // Where slats meet in the middle, left and right of one strip are neighbours too.
    const met = side === "right" ? strips.map((strip) => tones.get(`left ${strip}`)) : [];
    const row = tonesOfRow(
      strips.map((strip) => seedOf(side, strip)),
      met,
    );
    for (const [index, strip] of strips.entries()) tones.set(`${side} ${strip}`, row[index] ?? 0);
  }
  const cuts = Math.max(2, Math.min(mostCuts, Math.floor(mostCutsInAll / slats.length)));
  const laid: GrainStrip[] = [];
  const samples = new Map<string, GrainSample>();
  for (const { side, strip, order, trimmed, axis } of slats) {
    const neighbours = [-1, 0, 1].flatMap((step) =>
      [`left ${strip + step}`, `right ${strip + step}`, `whole ${strip + step}`].map((name) => samples.get(name)),
    );
    const chosen = leastAlike(
      Array.from({ length: cuts }, (_, cut) => ({
        region: trimmed,
        axis,
        tone: tones.get(`${side} ${strip}`) ?? 0,
        seed: seedOf(side, strip * 1000 + order + cut * 70_001),
      })),
      neighbours.filter((sample) => sample !== undefined),
      design.slatWidth,
    );
    samples.set(`${side} ${strip}`, chosen.sample);
    laid.push(chosen.strip);
  }
  const box = spine && boxOfRegion(spine.trimmed);
  if (!spine || !box) return laid;
  const middle = box.x + box.width / 2;
  const axis = { from: { x: middle, y: box.y }, to: { x: middle, y: box.y + box.height } };
  return [...laid, { region: spine.trimmed, axis, tone: spineTone, seed: seedOf("whole", 999_983) }];
}

/** Stretches of wood that are tried for a slat, for all slats together, and the likeness to a neighbour that is little enough. */
const mostCuts = 12;
const mostCutsInAll = 4_000;
const littleAlike = 0.12;

type SampledStrip = { readonly strip: GrainStrip; readonly sample: GrainSample; readonly alike: number };

/** The first of several cuts that is unlike every neighbour, or the one that is least like any. */
function leastAlike(cuts: readonly GrainStrip[], neighbours: readonly GrainSample[], widthMm: number): SampledStrip {
  let best: SampledStrip | null = null;
  for (const strip of cuts) {
    const sample = grainSample(strip, widthMm);
    const alike = Math.max(0, ...neighbours.map((neighbour) => Math.abs(grainAlikeness(sample, neighbour))));
    if (best === null || alike < best.alike) best = { strip, sample, alike };
    if (alike < littleAlike) break;
  }
  if (!best) throw new Error("A slat needs a cut to choose.");
  return best;
}

type SlatFace = {
  readonly document: MockupDocument;
  readonly kernel: Kernel;
  readonly layout: SlatLayout;
  readonly box: Box;
  readonly outline: Path;
  /** Width of the fine line along each joint. */
  readonly lineMm: number;
};

/** A backer of slats from the front: the substrate in the gaps, grain on the slats, a fine dark line along every joint. */
export function drawSlatFace({ document, kernel, layout, box, outline, lineMm }: SlatFace): Item[] {
  const { board, backer } = document;
  const colour = faceColour(backer);
  const grain = remembered(kernel, [board, layout, backer], "slat grain", () =>
    stripGrain(box, stripsOfSlats(layout, faceStock(backer).name), colour),
  );
  const joints = pathOfRegion([...layout.slats.flatMap(({ trimmed }) => trimmed), ...(layout.spine?.trimmed ?? [])]);
  const lines: Item = { kind: "path", path: joints, stroke: { colour: jointColour(colour), widthMm: lineMm } };
  const open = layout.design.gap > 0;
  const face: Item[] = open
    ? [
        ...drawGaps(document, joints, outline),
        { kind: "clip", clip: pathOfRegion(faceRegion(document, kernel)), items: [grain] },
      ]
    : [grain];
  return [
    { kind: "path", id: "board", path: outline, fill: open ? groundColour(document) : colour },
    { kind: "clip", clip: outline, items: [...face, lines] },
  ];
}

const jointColour = (wood: Colour): Colour => mixColours(wood, "#2E1C08", 0.52);

/** A substrate is seen only at the bottom of gaps, where little of the room's light comes. */
const groundColour = ({ backer }: MockupDocument): Colour => mixColours(backer.stock.colour, "#1F150A", 0.3);

/** The slats' shadows on the substrate: all of a gap that is narrower than they fall, else the slats moved once. */
function drawGaps({ backer, presentation: { light } }: MockupDocument, slats: Path, outline: Path): Item[] {
  const away = shadowDirection(light);
  const deep = shadowOffsetMm(backer.slats?.thickness ?? 0, light);
  const narrow = (backer.slats?.gap ?? 0) <= deep;
  const path = narrow ? outline : pathTransform(slats, translateMatrix(away.x * deep, away.y * deep));
  return [{ kind: "path", path, fill: shadowColour, opacity: boardStrength }];
}
