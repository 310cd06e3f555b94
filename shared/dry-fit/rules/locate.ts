import { type Located, locatingFit, proposedLocating } from "../../bonds/locating-method.ts";
import { countOf } from "../../mockup/change.ts";
import type { Layer, Locate } from "../../mockup/document.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords } from "../words.ts";

const source = "common practice";

/** Rule 20: the hand must find the place of a piece, above all of a bonded one. */
export const locate: Rule = {
  number: 20,
  title: "Locate",
  check,
  mends: ({ layerKey }, { document }) => document.layers.filter(({ key }) => key === layerKey).flatMap(mendsOf),
};

function check(input: RuleInput): Finding[] {
  return layersWithFigures(input).flatMap(({ layer, pieces }) => {
    const [first] = pieces;
    const text = first ? lostWords(layer) : null;
    if (!first || text === null) return [];
    return [
      foundBy(locate, {
        severity: "caution",
        text,
        layerKey: layer.key,
        pieceIds: pieces.map(({ piece }) => piece.id),
        where: first.figures.centroid,
        value: pieces.length,
        limit: 0,
        source,
      }),
    ];
  });
}

/** What keeps the hand from finding the place; null when nothing does, or when the hold itself does without being planned. */
function lostWords(layer: Layer): string | null {
  const located = locatedOf(layer);
  const { finds, why } = locatingFit(layer.locate, located);
  if (finds) return null;
  const count = countOf(located.pieces, "piece");
  if (layer.locate === "none") {
    if (located.hold !== "bond") return null;
    const are = located.pieces === 1 ? "is" : "are";
    return `${count} of ${layerWords(layer)} ${are} bonded with nothing to find the place by, and a bond can't be moved. ${adviceWords(located)}`;
  }
  // A panel without any standoff is rule 8's.
  if (located.hold === "standoff" && located.holes === 0) return null;
  return `${count} of ${layerWords(layer)} ${located.pieces === 1 ? "has its" : "have their"} place by ${methodWords[layer.locate]}, which does not find it. ${why} ${adviceWords(located)}`;
}

function locatedOf({ hold, pieces, stock }: Layer): Located {
  const holes = hold.kind === "standoff" ? hold.holes.length : 0;
  const opaque = stock.look === "opaque" || stock.look === "mirror";
  return { hold: hold.kind, pieces: pieces.length, holes, opaque };
}

const methodWords: Readonly<Record<Locate, string>> = {
  pocket: "a pocket",
  "scored line": "a scored line",
  template: "a template",
  "hole pattern": "the hole pattern",
  none: "nothing",
};

function adviceWords(located: Located): string {
  const method = proposedLocating(located);
  return `Plan ${methodWords[method]}: ${lowered(locatingFit(method, located).why)}`;
}

const lowered = (sentence: string): string => sentence.charAt(0).toLowerCase() + sentence.slice(1);

/** The best way first, then a scored line where it is hidden: it costs no sheet. */
function mendsOf(layer: Layer): Mend[] {
  const located = locatedOf(layer);
  return [...new Set([proposedLocating(located), "scored line" as const])]
    .filter((method) => method !== layer.locate && locatingFit(method, located).finds)
    .map((method) => ({
      label: `Plan ${methodWords[method]}`,
      steps: [{ kind: "locate", layerKey: layer.key, locate: method }],
    }));
}
