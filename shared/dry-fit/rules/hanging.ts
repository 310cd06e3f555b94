import { formatMass, formatStatedMass } from "../../units/mass.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";

const source = "arithmetic; what the wall carries is for the shop to state";

/** Rule 36: the wall's fixing carries the sign. */
export const hanging: Rule = { number: 36, title: "Hanging", check };

function check({ document, figures, limits, context }: RuleInput): Finding[] {
  const { kind, carriesKg } = document.hanging;
  const base = { layerKey: "A", where: { x: document.board.width / 2, y: document.board.height / 2 }, source };
  // Hardware, adhesive and finish are not weighed.
  const kg = (figures.massG / 1000) * (1 + limits.unweighedShare);
  const mass = (value: number) => formatMass(value * 1000, context.unit);
  if (kind === "none") {
    const text = `Nobody has chosen how the sign hangs. It weighs about ${mass(kg)} with its hardware.`;
    return [foundBy(hanging, { ...base, severity: "caution", text })];
  }
  if (carriesKg === null) {
    const text = `It is not stated what the ${kind} carries in this wall. The sign weighs about ${mass(kg)} with its hardware.`;
    return [foundBy(hanging, { ...base, severity: "caution", text })];
  }
  if (kg <= carriesKg) return [];
  const text = `The sign weighs about ${mass(kg)} with its hardware; the wall's fixing is stated to carry ${formatStatedMass(carriesKg, context.unit)}. Take another one, or a lighter sign.`;
  return [foundBy(hanging, { ...base, severity: "stop", text, value: kg, limit: carriesKg, unit: "kg" })];
}
