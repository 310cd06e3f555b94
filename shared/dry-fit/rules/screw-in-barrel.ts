import { screwMisfits } from "../../hardware/screw-fit.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords } from "../words.ts";

const source = "ASME B18.6.1 for the screw; arithmetic";

/** Rule 9: the wood screw goes through the barrel's bore and floor. */
export const screwInBarrel: Rule = { number: 9, title: "Screw in the barrel", check };

function check(input: RuleInput): Finding[] {
  const mm = (length: number) => formatFine(length, input.context.unit);
  return layersWithFigures(input).flatMap(({ layer }) => {
    const { hold } = layer;
    if (hold.kind !== "standoff" || hold.hardware.kind !== "capStud") return [];
    const [hole] = hold.holes;
    const { hardware } = hold;
    return screwMisfits(hardware).map(({ at, hasMm, needsMm }) => {
      const part =
        at === "bore" ? `head is ${mm(needsMm)} wide, the bore` : `shank is ${mm(needsMm)} thick, the floor's hole`;
      return foundBy(screwInBarrel, {
        severity: "stop",
        text: `${hardware.screw.name} does not go into ${hardware.name} of ${layerWords(layer)}: its ${part} ${mm(hasMm)}.`,
        layerKey: layer.key,
        where: hole ? { x: hole.x, y: hole.y } : null,
        value: hasMm,
        limit: needsMm,
        unit: "mm",
        source,
      });
    });
  });
}
