import { contrastRatio } from "../../colour/contrast.ts";
import { colouringCoats } from "../../colour/finish-colour.ts";
import { finishedWood } from "../../colour/finished-wood.ts";
import { type Lab, labOf } from "../../colour/lab.ts";
import { lrvOfLightness, luminanceContrast } from "../../colour/lrv.ts";
import type { MockupDocument } from "../../mockup/document.ts";
import { faceStock } from "../../stack/backer.ts";
import type { Finding } from "../finding.ts";
import { type Letter, lettersOf } from "../lettering.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layerWords } from "../words.ts";

const source = "WCAG 2.2, 1.4.11, for the ratio; 30 points after BS 8300-2; an estimate from the stock's colours";

/** Rule 25: lettering that stands out from what it lies on. One finding for each layer and ground. */
export const contrast: Rule = { number: 25, title: "Contrast", check };

/** What letters are seen against. */
type Ground = { readonly name: string; readonly colour: string | null; readonly lab: Lab };

function check(input: RuleInput): Finding[] {
  const byGround = new Map<string, Letter[]>();
  for (const letter of lettersOf(input)) {
    const on = letter.figures.restsOn[0] ?? "A";
    const name = `${letter.layer.key} on ${on}`;
    byGround.set(name, [...(byGround.get(name) ?? []), letter]);
  }
  return [...byGround.values()].flatMap((letters) => checkLetters(letters, input));
}

function checkLetters(letters: readonly Letter[], { document, limits }: RuleInput): Finding[] {
  const [first] = letters;
  if (!first) return [];
  const { layer, figures } = first;
  const base = {
    layerKey: layer.key,
    pieceIds: letters.map(({ piece }) => piece.id),
    where: figures.centroid,
    source,
  };
  if (layer.stock.look === "mirror" || layer.stock.look === "clear") {
    const shows = layer.stock.look === "mirror" ? "what it reflects" : "what lies behind it";
    const text = `The letters of ${layerWords(layer)} are ${layer.stock.look}: they show ${shows}, so no figure says how they stand out. Look at a sample on site.`;
    return [foundBy(contrast, { ...base, severity: "remark", text })];
  }
  const ground = groundOf(document, figures.restsOn[0] ?? "A");
  const own: Ground = { name: layer.stock.name, colour: layer.stock.colour, lab: labOf(layer.stock.colour) };
  const [mine, theirs] = [lrvOfLightness(own.lab.L), lrvOfLightness(ground.lab.L)];
  if (!mine.ok || !theirs.ok) return [];
  const points = luminanceContrast(mine.value, theirs.value);
  if (!points.ok) return [];
  // The finish is known as a colour of the laboratory only, so its ratio is taken from the luminances.
  const ratio =
    own.colour && ground.colour ? contrastRatio(own.colour, ground.colour) : ratioOf(mine.value, theirs.value);
  const lowRatio = ratio < limits.contrastRatio;
  if (!lowRatio && points.value.points >= limits.contrastPoints) return [];
  const said = lowRatio
    ? `${ratio.toFixed(2)} to 1, ${limits.contrastRatio} to 1 is the least`
    : `${points.value.points.toFixed(0)} points of light reflectance apart, ${limits.contrastPoints} are the least`;
  // A layer is often named after its stock.
  const of = layer.name.startsWith(own.name) ? "" : `, ${own.name},`;
  return [
    foundBy(contrast, {
      ...base,
      severity: "caution",
      text: `The letters of ${layerWords(layer)}${of} hardly stand out from ${ground.name}: ${said}.`,
      value: lowRatio ? ratio : points.value.points,
      limit: lowRatio ? limits.contrastRatio : limits.contrastPoints,
      unit: lowRatio ? "to 1" : "points",
    }),
  ];
}

function groundOf(document: MockupDocument, key: string): Ground {
  const layer = document.layers.find((one) => one.key === key);
  if (layer) return { name: layer.stock.name, colour: layer.stock.colour, lab: labOf(layer.stock.colour) };
  const { finish } = document.backer;
  const stock = faceStock(document.backer);
  const bare = labOf(stock.colour);
  const coats = colouringCoats(finish);
  const finished = finishedWood(bare, coats);
  if (coats.length === 0 || !finished.ok) return { name: stock.name, colour: stock.colour, lab: bare };
  return { name: `${stock.name} with its finish`, colour: null, lab: finished.value };
}

/** WCAG's ratio from luminances in percent. */
function ratioOf(one: number, other: number): number {
  return (Math.max(one, other) / 100 + 0.05) / (Math.min(one, other) / 100 + 0.05);
}
