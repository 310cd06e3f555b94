import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { moveHoleMends } from "../mends/move-hole.ts";
import { type FrontPlace, frontAt, type Thing, thingsOver } from "../on-panel.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { pieceAt, type StandoffLayer, standoffLayers } from "../standoff-layers.ts";
import { layerWords } from "../words.ts";

const source = "arithmetic; the clearance is common practice";

/** Rule 13: a cap, a screw's head or a grip lies on one level, or what is beside it is notched to clear it. */
export const capOnLevel: Rule = { number: 13, title: "Cap on one level", check, mends: moveHoleMends };

function check(input: RuleInput): Finding[] {
  return standoffLayers(input).flatMap((standing) => checkLayer(standing, input));
}

function checkLayer(standing: StandoffLayer, input: RuleInput): Finding[] {
  const { hold, level } = standing;
  const over = thingsOver(input, level);
  return hold.holes.flatMap((hole): Finding[] => {
    const piece = pieceAt(standing, hole);
    if (!piece) return [];
    const at = frontAt(hole, { hold, piece, things: over(piece), clearanceMm: input.limits.capClearanceMm });
    const said = stepWords(standing, at, input) ?? lowWords(standing, at);
    if (!said) return [];
    return [
      foundBy(capOnLevel, {
        severity: "stop",
        text: said.text,
        layerKey: standing.layer.key,
        pieceIds: said.things.flatMap(({ pieceId }) => pieceId ?? []),
        holeId: hole.id,
        where: { x: hole.x, y: hole.y },
        value: said.value,
        limit: said.value === null ? null : 0,
        unit: said.value === null ? null : "mm",
        source,
      }),
    ];
  });
}

type Said = { readonly text: string; readonly things: readonly Thing[]; readonly value: number | null };

function stepWords({ layer }: StandoffLayer, { front, over }: FrontPlace, { limits, context }: RuleInput): Said | null {
  const [deepest, ...others] = over.toSorted((a, b) => b.notchMm - a.notchMm);
  if (!front || !deepest) return null;
  const mm = (length: number) => formatFine(length, context.unit);
  const more = others.length === 0 ? "" : ` and ${others.length} more`;
  const what = `The ${mm(front.diameter)} ${front.what} at a hole of ${layerWords(layer)}`;
  const meets = `does not clear ${deepest.thing.words}${more}`;
  const why =
    front.what === "grip"
      ? "it does not go over the edge there"
      : "tightened on a step it tilts, shows a gap and cracks the sheet";
  const notch = `or notch ${others.length === 0 ? "it" : "the first"} by ${mm(deepest.notchMm)}, ${mm(limits.capClearanceMm)} of that to clear it`;
  const mend = deepest.thing.pieceId === null ? "" : `, ${notch}`;
  const text = `${what} ${meets}: ${why}. Move the hole${mend}.`;
  return { text, things: over.map(({ thing }) => thing), value: deepest.notchMm };
}

function lowWords({ layer }: StandoffLayer, { front, under }: FrontPlace): Said | null {
  const [first] = under;
  if (!front || !first) return null;
  const text = `The ${front.what} at a hole of ${layerWords(layer)} stands higher than ${first.words} over it leaves room for. Raise that, or move the hole.`;
  return { text, things: under, value: null };
}
