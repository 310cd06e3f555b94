import { countOf } from "../../mockup/change.ts";
import { slatRefusalWords, startPlace, startWords } from "../../slats/slat-words.ts";
import { sliversOf } from "../../slats/slivers.ts";
import { slatsOf } from "../../stack/backer.ts";
import { formatLengthWithUnit } from "../../units/format-length.ts";
import { bestStart, startedAt } from "../best-start.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";

const source = "common practice";

/** Rule 32: slats can be laid as they are meant, and trimming leaves none of them shorter than it is wide. */
export const slivers: Rule = { number: 32, title: "Slats", check, mends };

function check(input: RuleInput): Finding[] {
  const { document, kernel, context } = input;
  const { board, backer } = document;
  const laid = slatsOf(document, kernel);
  if (!laid || !backer.slats) return [];
  if (!laid.ok) {
    const where = { x: board.width / 2, y: board.height / 2 };
    const text = `The slats can't be laid. ${slatRefusalWords(laid.reason, context.unit)}`;
    return [
      foundBy(slivers, { severity: "stop", text, where, value: numberOf(laid.reason.value), source: "arithmetic" }),
    ];
  }
  const found = sliversOf(laid.value);
  const [first, ...others] = found;
  if (!first) return [];
  const { slat, lengthMm, limitMm } = others.reduce(
    (least, one) => (one.lengthMm < least.lengthMm ? one : least),
    first,
  );
  const mm = (length: number) => formatLengthWithUnit(length, context.unit);
  const choice = bestStart(document, kernel);
  const best = choice ? startWords(choice, startPlace(backer.slats), context.unit) : "Try another start.";
  const { from, to } = slat.axis;
  return [
    foundBy(slivers, {
      severity: "caution",
      text: `Trimming leaves ${countOf(found.length, "slat")} of ${laid.value.slats.length} shorter than ${found.length === 1 ? "it is" : "they are"} wide, ${mm(limitMm)}: slat ${slat.order} is ${mm(lengthMm)} long. Such a sliver is hard to cut, to hold and to glue. ${best}`,
      where: { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 },
      value: lengthMm,
      limit: limitMm,
      unit: "mm",
      source,
    }),
  ];
}

/** The start that leaves no sliver, where there is one. */
function mends({ severity }: Finding, { document, kernel, context }: RuleInput): Mend[] {
  const { slats } = document.backer;
  const choice = severity === "caution" ? bestStart(document, kernel) : null;
  if (!slats || !choice || choice.best.slivers > 0) return [];
  const { height } = choice.best;
  const { edge, at } = startPlace(slats);
  const label = `Begin ${formatLengthWithUnit(height, context.unit)} from the ${edge} edge at the ${at}`;
  return [{ label, steps: [{ kind: "slat start", start: startedAt(slats, height).start }] }];
}

const numberOf = (value: number): number | null => (Number.isFinite(value) ? value : null);
