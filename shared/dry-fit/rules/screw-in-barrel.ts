import { type ScrewMisfit, screwMisfits } from "../../hardware/screw-fit.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { fittingScrewMends } from "../mends/screw-mends.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { standoffLayers } from "../standoff-layers.ts";
import { layerWords } from "../words.ts";

const source = "ASME B18.6.1 for the screw; arithmetic";

/** Rule 9: the wood screw goes through the barrel's bore and floor, an edge grip's floor or a spacer. */
export const screwInBarrel: Rule = { number: 9, title: "Screw in the barrel", check, mends: fittingScrewMends };

const passes: Readonly<
  Record<ScrewMisfit["at"], { readonly part: string; readonly is: string; readonly way: string }>
> = {
  "floor hole": { part: "shank", is: "thick", way: "floor's hole" },
  bore: { part: "head", is: "wide", way: "bore" },
  spacer: { part: "shank", is: "thick", way: "spacer's bore" },
};

function check(input: RuleInput): Finding[] {
  const mm = (length: number) => formatFine(length, input.context.unit);
  return standoffLayers(input).flatMap(({ layer, hold }) => {
    const { hardware, holes } = hold;
    if (hardware.kind === "blindStud") return [];
    const [hole] = holes;
    return screwMisfits(hardware).map(({ at, hasMm, needsMm }) => {
      const { part, is, way } = passes[at];
      return foundBy(screwInBarrel, {
        severity: "stop",
        text: `${hardware.screw.name} does not go into ${hardware.name} of ${layerWords(layer)}: its ${part} is ${mm(needsMm)} ${is}, the ${way} ${mm(hasMm)}.`,
        layerKey: layer.key,
        holeId: hole?.id ?? null,
        where: hole ? { x: hole.x, y: hole.y } : null,
        value: hasMm,
        limit: needsMm,
        unit: "mm",
        source,
      });
    });
  });
}
