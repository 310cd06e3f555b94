import {
  familyFacts,
  pairFit,
  type Surface,
  type TwoStepJoint,
  tackThenBond,
  waitingHours,
} from "../../bonds/adhesive-families.ts";
import { faceStock } from "../../stack/backer.ts";
import type { Finding } from "../finding.ts";
import { adhesiveMends, isSolvent } from "../fitting-adhesive.ts";
import { adhesivesOf, type GluedLayer, type JoinedLayer, joinedLayers, piecesOf, surfacesOf } from "../joints.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { hoursWords, layerWords } from "../words.ts";

const source = "common practice; the maker's sheet goes before it";

/** Rule 18: an adhesive that bonds what it is to bond, and what to mind with it. */
export const adhesiveFits: Rule = {
  number: 18,
  title: "Adhesive",
  check,
  mends: (finding, input) => (finding.severity === "remark" ? [] : adhesiveMends(finding.layerKey, input)),
};

function check(input: RuleInput): Finding[] {
  return joinedLayers(input).flatMap((joined) => {
    const misfits = misfitsOf(joined, input);
    return misfits.length > 0 ? misfits : [...crazing(joined), cautionsOf(joined, input)];
  });
}

const surfaceWords: Readonly<Record<Surface, string>> = {
  acrylic: "acrylic",
  "coated back": "a coated back",
  "raw wood": "raw wood",
  "finished wood": "finished wood",
};

/** One stop for what lies on acrylic and one for what lies on the wood, though it be several things. */
function misfitsOf({ layer, joints }: JoinedLayer, { document }: RuleInput): Finding[] {
  const sides = [joints.filter(({ under }) => under === null), joints.filter(({ under }) => under !== null)];
  return sides.flatMap((side): Finding[] => {
    const [joint] = side;
    if (!joint) return [];
    const surfaces = surfacesOf(layer, joint.under, document);
    const [back, face] = surfaces;
    const on = side.map(({ under }) => (under ? layerWords(under) : faceStock(document.backer).name)).join(" and ");
    const pieces = piecesOf(side);
    for (const adhesive of adhesivesOf(layer)) {
      const fit = pairFit(adhesive.family, ...surfaces);
      if (fit.fits) continue;
      return [
        foundBy(adhesiveFits, {
          severity: "stop",
          text: `${adhesive.name} of ${layerWords(layer)} does not bond ${surfaceWords[back]} to ${surfaceWords[face]} (${on}). ${fit.why}`,
          layerKey: layer.key,
          pieceIds: pieces.map(({ piece }) => piece.id),
          where: pieces[0]?.figures.centroid ?? null,
          source,
        }),
      ];
    }
    return [];
  });
}

/** Solvent that runs along laser-cut edges in a pocket of acrylic. */
function crazing({ layer, joints }: JoinedLayer): Finding[] {
  const { hold } = layer;
  const pieces = piecesOf(joints.filter(({ under }) => under !== null));
  if (hold.kind !== "pocket" || pieces.length === 0 || !isSolvent(hold.adhesive)) return [];
  const edges = hold.cut === "engraved" ? "the engraved pocket and the piece's laser-cut edge" : "the laser-cut edge";
  return [
    foundBy(adhesiveFits, {
      severity: "caution",
      text: `${hold.adhesive.name} of ${layerWords(layer)} runs round in its pocket and can craze ${edges}. Let them rest or anneal them first, or take an adhesive without solvent.`,
      layerKey: layer.key,
      pieceIds: pieces.map(({ piece }) => piece.id),
      where: pieces[0]?.figures.centroid ?? null,
      source,
    }),
  ];
}

function cautionsOf({ layer, joints }: JoinedLayer, { document }: RuleInput): Finding {
  const adhesives = adhesivesOf(layer);
  const joint = twoSteps(layer);
  const { handling, full } = waitingHours(joint ?? layer.hold.adhesive.family);
  const remarks = joints.flatMap(({ under }) =>
    adhesives.flatMap(({ family }) => {
      const fit = pairFit(family, ...surfacesOf(layer, under, document));
      return fit.fits ? fit.remarks : [];
    }),
  );
  const cautions = adhesives.flatMap(({ family }) => familyFacts(family).cautions);
  const start = joint
    ? `${adhesives[0]?.name} tacks ${layerWords(layer)}, after ${hoursWords(joint.betweenHours)} ${layer.hold.adhesive.name} bonds it:`
    : `${layer.hold.adhesive.name} bonds ${layerWords(layer)}:`;
  const moved = handling === 0 ? "holds at once" : `can be moved after ${hoursWords(handling)}`;
  return foundBy(adhesiveFits, {
    severity: "remark",
    text: [
      `${start} it ${moved}, and is at its full strength after ${hoursWords(full)}.`,
      ...new Set([...remarks, ...cautions]),
    ].join(" "),
    layerKey: layer.key,
    where: joints[0]?.pieces[0]?.figures.centroid ?? null,
    value: full,
    unit: "h",
    source,
  });
}

function twoSteps({ hold }: GluedLayer): TwoStepJoint | null {
  if (hold.kind !== "bond" || !hold.tack) return null;
  return tackThenBond(hold.tack.family, hold.adhesive.family);
}
