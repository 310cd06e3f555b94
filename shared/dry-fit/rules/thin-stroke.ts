import { unsupportedPart } from "../../bonds/support.ts";
import { boxesOverlap, boxOfRegion } from "../../geometry/box.ts";
import type { Kernel } from "../../geometry/kernel.ts";
import type { Region } from "../../geometry/path.ts";
import type { Layer, Piece } from "../../mockup/document.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { type ThinPlace, thinnestWidth, thinPlaces } from "../../stack/thin-places.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding, Severity } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { supportOf } from "../under.ts";
import { layersWithFigures, pieceWords } from "../words.ts";

const source = "common practice";

/** Rule 3: strokes that break when the piece is handled, or later where nothing holds them. */
export const thinStroke: Rule = { number: 3, title: "Thin stroke", check };

function check(input: RuleInput): Finding[] {
  return layersWithFigures(input).flatMap(({ layer, level, pieces }) =>
    pieces.flatMap(({ piece, figures }) => checkPiece(layer, level, piece, figures, input)),
  );
}

function checkPiece(layer: Layer, level: number, piece: Piece, figures: PieceFigures, input: RuleInput): Finding[] {
  const { limits, kernel } = input;
  const freePart = freePartOf(layer, level, figures, input);
  const freeLimit = Math.max(limits.freeStrokeMm, layer.thickness);
  const thinAndFree = thinPlaces(figures.region, freeLimit, kernel).filter((place) => reaches(place, freePart, kernel));
  if (thinAndFree.length > 0) {
    const worst = thinnestOf(thinAndFree, figures.region, freeLimit, kernel);
    const stop = worst.widthMm < limits.freeStrokeMm;
    return [
      thin({
        layer,
        piece,
        input,
        severity: stop ? "stop" : "caution",
        limit: stop ? limits.freeStrokeMm : freeLimit,
        ...worst,
        why: stop
          ? "It is free there and breaks in the hand."
          : `It is free there and thinner than its ${formatFine(layer.thickness, input.context.unit)} sheet.`,
      }),
    ];
  }
  if (layer.hold.kind === "standoff") return [];
  const worst = thinnestWidth(figures.region, limits.bondedStrokeMm, kernel);
  if (!worst) return [];
  return [
    thin({
      layer,
      piece,
      input,
      severity: "caution",
      limit: limits.bondedStrokeMm,
      ...worst,
      why: "Once bonded it is held, but it can break before.",
    }),
  ];
}

/** What of a piece nothing holds: all of it on standoffs, what hangs over when bonded, nothing in a pocket. */
function freePartOf(layer: Layer, level: number, figures: PieceFigures, input: RuleInput): Region {
  if (layer.hold.kind === "standoff") return figures.region;
  if (layer.hold.kind === "pocket") return [];
  const support = supportOf(input, level, figures);
  return unsupportedPart(figures.region, support, input.kernel);
}

function reaches(place: ThinPlace, free: Region, kernel: Kernel): boolean {
  const [a, b] = [boxOfRegion(place.region), boxOfRegion(free)];
  if (!a || !b || !boxesOverlap(a, b)) return false;
  return kernel.intersect(place.region, free).length > 0;
}

/**
 * The thinnest of the places that matter: the region's own thinnest when it lies in one of them, else measured place by
 * place.
 */
function thinnestOf(
  places: readonly ThinPlace[],
  region: Region,
  limit: number,
  kernel: Kernel,
): { readonly widthMm: number; readonly where: ThinPlace["where"] } {
  let passes = 0;
  let fails = limit;
  let where = places[0]?.where ?? { x: 0, y: 0 };
  const inPlaces = kernel.union(
    places.flatMap((place) => place.region),
    "nonzero",
  );
  while (fails - passes > 0.02) {
    const middle = (passes + fails) / 2;
    const still = thinPlaces(region, middle, kernel).find((place) => reaches(place, inPlaces, kernel));
    if (still) {
      fails = middle;
      where = still.where;
    } else passes = middle;
  }
  return { widthMm: passes, where };
}

function thin(found: {
  layer: Layer;
  piece: Piece;
  input: RuleInput;
  severity: Severity;
  limit: number;
  widthMm: number;
  where: ThinPlace["where"];
  why: string;
}): Finding {
  const { layer, piece, input, severity, limit, widthMm, where, why } = found;
  const { unit } = input.context;
  // Under a tenth there is no stroke left to speak of.
  const width = widthMm < 0.1 ? "runs out to a point" : `is ${formatFine(widthMm, unit)} wide at its thinnest`;
  return foundBy(thinStroke, {
    severity,
    text: `${pieceWords(layer, piece)} ${width}; ${formatFine(limit, unit)} is the least. ${why}`,
    layerKey: layer.key,
    pieceIds: [piece.id],
    where,
    value: widthMm,
    limit,
    unit: "mm",
    source,
  });
}
