import { type Kernel, remembered } from "../../geometry/kernel.ts";
import type { Region } from "../../geometry/path.ts";
import { passesPanel } from "../../hardware/standoff-parts.ts";
import { countOf } from "../../mockup/change.ts";
import type { Layer } from "../../mockup/document.ts";
import { mirrorLine } from "../../pieces/mirror-symmetry.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { discsRegion, shapeRegion } from "../../stack/piece-region.ts";
import type { Finding } from "../finding.ts";
import type { PieceWithFigures } from "../joints.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords, namesWords } from "../words.ts";

const source = "arithmetic; marking the film is common practice";

/** Rule 29: pieces that fit their place with one face up only, or whose two faces look different. */
export const handed: Rule = {
  number: 29,
  title: "Face up",
  check,
  mends: ({ severity, layerKey }) =>
    severity === "caution" && layerKey !== null
      ? [{ label: "Mark the film on the back", steps: [{ kind: "marked", layerKey, marked: "back" }] }]
      : [],
};

/** Whether a piece fits its place with one face up only; it depends on the piece's region alone. */
export function measureHanded({ region }: Pick<PieceFigures, "region">, toleranceMm: number, kernel: Kernel): boolean {
  return remembered(kernel, region, `handed ${toleranceMm}`, () => isHanded(region, toleranceMm, kernel));
}

function isHanded(region: Region, toleranceMm: number, kernel: Kernel): boolean {
  return region.length > 0 && mirrorLine(region, kernel, toleranceMm) === null;
}

function check(input: RuleInput): Finding[] {
  return layersWithFigures(input).flatMap(({ layer, pieces }): Finding[] => {
    const there = pieces.filter(({ figures }) => figures.areaMm2 > 0);
    const oneWay = there.filter((one) => isHandedInLayer(layer, one, input));
    const marked = layer.stock.facesDiffer ? there : oneWay;
    const [first] = marked;
    if (!first) return [];
    const unstated = layer.marked === "not stated";
    return [
      foundBy(handed, {
        severity: unstated ? "caution" : "remark",
        text: `${factWords(layer, there.length, oneWay)} ${unstated ? "Nothing says on which face the film is marked: state it, or one is laid face down." : `The film is marked on the ${layer.marked}: check each as it is laid.`}`,
        layerKey: layer.key,
        pieceIds: marked.map(({ piece }) => piece.id),
        where: first.figures.centroid,
        value: marked.length,
        limit: 0,
        source,
      }),
    ];
  });
}

/** A panel that is its own mirror image is still handed when its holes are not. */
function isHandedInLayer(
  { hold }: Layer,
  { piece, figures }: PieceWithFigures,
  { limits, kernel }: RuleInput,
): boolean {
  if (measureHanded({ region: shapeRegion(piece, kernel) }, limits.mirrorMm, kernel)) return true;
  if (hold.kind !== "standoff" || hold.holes.length === 0 || !passesPanel(hold.hardware)) return false;
  const drilled = kernel.difference(figures.region, discsRegion(hold.holes, kernel));
  return measureHanded({ region: drilled }, limits.mirrorMm, kernel);
}

function factWords(layer: Layer, count: number, oneWay: readonly PieceWithFigures[]): string {
  const names = namesWords(oneWay.map(({ piece }) => piece));
  const listed = names === "" ? "" : ` (${names})`;
  const fits = oneWay.length === 1 ? "fits" : "fit";
  const handedWords =
    oneWay.length === 0
      ? ""
      : `${oneWay.length === count ? countOf(count, "piece") : `${oneWay.length} of ${countOf(count, "piece")}`} of ${layerWords(layer)}${listed} ${fits} with one face up only.`;
  const faces = `The two faces of ${layer.stock.name} look different`;
  if (!layer.stock.facesDiffer) return handedWords;
  return oneWay.length === 0
    ? `${faces}, and ${countOf(count, "piece")} of ${layerWords(layer)} ${count === 1 ? "is" : "are"} cut from it.`
    : `${handedWords} ${faces}.`;
}
