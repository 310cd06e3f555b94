import { remembered } from "../../geometry/kernel.ts";
import { countOf } from "../../mockup/change.ts";
import type { Layer, Piece } from "../../mockup/document.ts";
import { type NearTwins, nearTwins } from "../../pieces/near-twins.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { shapeRegion } from "../../stack/piece-region.ts";
import { formatLengthWithUnit } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, namesWords } from "../words.ts";

type Cut = { readonly layer: Layer; readonly piece: Piece; readonly figures: PieceFigures };

/** Rule 30: pieces of one sheet that an eye takes for one another, or that look right upside down. */
export const twins: Rule = { number: 30, title: "Near twins", check };

/** How many groups a finding names before it only counts. */
const mostGroups = 3;

function check(input: RuleInput): Finding[] {
  const { limits, kernel, context } = input;
  return bySheet(input).flatMap((cuts): Finding[] => {
    const shapes = cuts.map(({ piece }) => ({ id: piece.id, region: shapeRegion(piece, kernel) }));
    const alikeBy = {
      sameMm: limits.twinSameMm,
      alikeMm: limits.twinAlikeMm,
      alikeShare: limits.twinAlikeShare,
    };
    const which = JSON.stringify([shapes.map(({ id, region }) => [id, region.length]), alikeBy]);
    const found = remembered(
      kernel,
      shapes.flatMap(({ region }) => region),
      `twins among ${which}`,
      () => nearTwins(shapes, kernel, alikeBy),
    );
    const ids = new Set(found.flatMap((one) => (one.kind === "turned" ? one.ids : [...one.ids, ...one.others])));
    const alike = cuts.filter(({ piece }) => ids.has(piece.id));
    const [first] = alike;
    if (!first) return [];
    const sheet = `${first.layer.stock.name} (${formatLengthWithUnit(first.layer.thickness, context.unit)})`;
    const oneLayer = alike.every(({ layer }) => layer.key === first.layer.key);
    return [
      foundBy(twins, {
        severity: "remark",
        text: `${countOf(alike.length, "piece")} of ${sheet} can be laid wrong and look right: ${groupWords(found, alike)}. Mark each with its place, and which way is up.`,
        layerKey: oneLayer ? first.layer.key : null,
        pieceIds: alike.map(({ piece }) => piece.id),
        where: first.figures.centroid,
        value: alike.length,
        limit: 0,
        source: "our choice",
      }),
    ];
  });
}

/** Pieces that are cut from the same sheet, sheet by sheet: only those lie in one heap. */
function bySheet(input: RuleInput): Cut[][] {
  const sheets = new Map<string, Cut[]>();
  for (const { layer, pieces } of layersWithFigures(input)) {
    const sheet = JSON.stringify([layer.stock.stockId ?? layer.stock.name, layer.thickness]);
    const cuts = sheets.get(sheet) ?? [];
    cuts.push(...pieces.filter(({ figures }) => figures.areaMm2 > 0).map((one) => ({ layer, ...one })));
    sheets.set(sheet, cuts);
  }
  return [...sheets.values()];
}

function groupWords(found: readonly NearTwins[], cuts: readonly Cut[]): string {
  const pieces = new Map(cuts.map(({ piece, layer }) => [piece.id, { name: piece.name || `one of ${layer.key}` }]));
  const words = (ids: readonly string[]) => namesWords(ids.flatMap((id) => pieces.get(id) ?? []));
  const turned = found.flatMap((one) => (one.kind === "turned" ? one.ids : []));
  const groups = [
    ...exchangedGroups(found).map((ids) => `${words(ids)} in each other's place`),
    ...(turned.length > 0 ? [`${words(turned)} upside down`] : []),
  ];
  const more = groups.length - mostGroups;
  return more > 0 ? `${groups.slice(0, mostGroups).join("; ")}; and ${countOf(more, "more group")}` : groups.join("; ");
}

/** Pieces that are alike through any chain of others, in the order in which they were found. */
function exchangedGroups(found: readonly NearTwins[]): string[][] {
  const groups: Set<string>[] = [];
  for (const one of found) {
    if (one.kind !== "exchanged") continue;
    const ids = [...one.ids, ...one.others];
    const touched = groups.filter((group) => ids.some((id) => group.has(id)));
    const [into] = touched;
    if (!into) {
      groups.push(new Set(ids));
      continue;
    }
    for (const group of touched) {
      for (const id of group) into.add(id);
      if (group !== into) groups.splice(groups.indexOf(group), 1);
    }
    for (const id of ids) into.add(id);
  }
  return groups.map((group) => [...group]);
}
