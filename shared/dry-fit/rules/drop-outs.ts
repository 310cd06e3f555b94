import { boxContains } from "../../geometry/box.ts";
import { regionContains } from "../../geometry/contains.ts";
import { type Kernel, remembered } from "../../geometry/kernel.ts";
import type { Point } from "../../geometry/path.ts";
import { countOf } from "../../mockup/change.ts";
import type { Layer } from "../../mockup/document.ts";
import { type DropOut, dropOuts as islandsOf } from "../../pieces/drop-outs.ts";
import { templateIslands } from "../../pieces/template-islands.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { holdsPiece } from "../../stack/held-piece.ts";
import { formatLength, formatLengthWithUnit } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import type { PieceWithFigures } from "../joints.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords } from "../words.ts";

type LayerWithFigures = ReturnType<typeof layersWithFigures>[number];

const source = "arithmetic";
/** How many places a finding lists before it only counts. */
const mostPlaces = 4;

/** Rule 5: islands in an opening, that nothing holds once the plate or the template is cut. */
export const dropOuts: Rule = {
  number: 5,
  title: "Drop-outs",
  check,
  mends: (finding, input) => {
    const loose = layersWithFigures(input)
      .filter(({ layer }) => layer.key === finding.layerKey)
      .flatMap(looseIslands)
      .filter(({ piece }) => finding.pieceIds.includes(piece.id));
    if (loose.length === 0 || loose.length < finding.pieceIds.length) return [];
    const label = `Leave out the ${countOf(loose.length, "island")}`;
    return [{ label, steps: [{ kind: "drop pieces", pieceIds: loose.map(({ piece }) => piece.id) }] }];
  },
};

/** Islands in a piece's own openings; they depend on its region alone. */
export function measurePlateIslands({ region }: Pick<PieceFigures, "region">): readonly DropOut[] {
  // An island lies inside a hole, which lies inside an outline.
  return region.length < 3 ? [] : islandsOf(region);
}

/** Islands of a sheet that a piece is cut out of as a template; they depend on its region alone. */
export function measureTemplateIslands({ region }: Pick<PieceFigures, "region">, kernel: Kernel): readonly DropOut[] {
  if (region.length < 2) return [];
  return remembered(kernel, region, "template islands", () => templateIslands(region, kernel));
}

type Places = { readonly piece: PieceWithFigures; readonly places: readonly Point[] };
type Words = { readonly what: string; readonly whyOne: string; readonly whyMany: string };

const ofPlate: Words = {
  what: "loose in openings of its own pieces",
  whyOne: "It falls out when it is cut: bridge it, or lay it by hand.",
  whyMany: "They fall out when they are cut: bridge them, or lay them by hand.",
};
const ofPanel: Words = {
  what: "in openings of a panel, with no standoff of its own",
  whyOne: "Nothing holds it there.",
  whyMany: "Nothing holds them there.",
};
const ofTemplate: Words = {
  what: "in its template",
  whyOne: "It falls out of the cut-out sheet: bridge it, or lay that place by hand.",
  whyMany: "They fall out of the cut-out sheet: bridge them, or lay those places by hand.",
};

function check(input: RuleInput): Finding[] {
  return layersWithFigures(input).flatMap((one) => {
    const { layer, pieces } = one;
    const placesOf = (measure: (figures: PieceFigures) => readonly DropOut[]) =>
      pieces.map((piece) => ({ piece, places: measure(piece.figures).map(({ where }) => where) }));
    const loose = looseIslands(one).map((piece) => ({ piece, places: [piece.figures.centroid] }));
    const template =
      layer.locate === "template" ? placesOf((figures) => measureTemplateIslands(figures, input.kernel)) : [];
    return [
      ...found(layer, placesOf(measurePlateIslands), ofPlate, input),
      ...found(layer, loose, ofPanel, input),
      ...found(layer, template, ofTemplate, input),
    ];
  });
}

function found(layer: Layer, all: readonly Places[], words: Words, { context }: RuleInput): Finding[] {
  const some = all.filter(({ places }) => places.length > 0);
  const places = some.flatMap((one) => one.places);
  const [first] = places;
  if (!first) return [];
  // Rings about one middle have their islands there, one in the other.
  const spots = [
    ...new Set(places.map(({ x, y }) => `${formatLength(x, context.unit)} | ${formatLengthWithUnit(y, context.unit)}`)),
  ];
  const listed = spots.slice(0, mostPlaces);
  const more = spots.length > listed.length ? ` and ${spots.length - listed.length} more places` : "";
  const pieces = some.map(({ piece }) => piece);
  return [
    foundBy(dropOuts, {
      severity: "caution",
      text: `${layerWords(layer)} has ${countOf(places.length, "island")} ${words.what}: at ${listed.join(", ")}${more}. ${places.length === 1 ? words.whyOne : words.whyMany}`,
      layerKey: layer.key,
      pieceIds: pieces.map(({ piece }) => piece.id),
      where: first,
      value: places.length,
      limit: 0,
      source,
    }),
  ];
}

/** Pieces of a layer on standoffs that lie inside an opening of another one, and that no standoff holds. */
function looseIslands({ layer, pieces }: LayerWithFigures): PieceWithFigures[] {
  const { hold } = layer;
  if (hold.kind !== "standoff") return [];
  return pieces.filter(
    ({ figures }) =>
      figures.areaMm2 > 0 &&
      !hold.holes.some((hole) => holdsPiece(hold.hardware, figures.region, hole)) &&
      pieces.some((other) => other.figures !== figures && liesInOpening(figures, other.figures)),
  );
}

function liesInOpening(inner: PieceFigures, outer: PieceFigures): boolean {
  const corner = inner.region[0]?.[0];
  if (!corner || outer.region.length < 2 || !boxContains(outer.box, inner.box)) return false;
  return !regionContains(outer.region, corner) && outer.region.some((ring) => regionContains([ring], corner));
}
