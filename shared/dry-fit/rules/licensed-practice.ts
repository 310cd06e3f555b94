import { formatMass } from "../../units/mass.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";

const source = "local codes and licensed practice come first";

/** Rule 38: what a shop must not judge alone. */
export const licensedPractice: Rule = { number: 38, title: "Ask a professional", check };

function check({ document, figures, limits, context }: RuleInput): Finding[] {
  const kg = (figures.massG / 1000) * (1 + limits.unweighedShare);
  const base = {
    severity: "stop" as const,
    where: { x: document.board.width / 2, y: document.board.height / 2 },
    source,
  };
  const ask = "Ask a licensed professional, and follow the local code; then an owner sets this aside with their name.";
  const reasons = [
    context.place === "outside" && `The sign hangs outside, in wind and weather. ${ask}`,
    context.overhead && `The sign hangs over where people stand or walk. ${ask}`,
    context.electrical && `The sign has electrical parts. Their wiring is for a licensed electrician. ${ask}`,
  ].filter((reason) => reason !== false);
  const found = reasons.map((text) => foundBy(licensedPractice, { ...base, text }));
  if (kg <= limits.heaviestKg) return found;
  const mass = (value: number) => formatMass(value * 1000, context.unit);
  const text = `The sign weighs about ${mass(kg)}; over ${mass(limits.heaviestKg)} its hanging is not for the shop alone. ${ask}`;
  return [...found, foundBy(licensedPractice, { ...base, text, value: kg, limit: limits.heaviestKg, unit: "kg" })];
}
