import { lengthsEqual } from "../../geometry/tolerance.ts";
import {
  findEntry,
  hasThickness,
  nearestSheet,
  nearestThickness,
  sameThicknessMm,
} from "../../materials/find-stock.ts";
import type { AcrylicStock } from "../../materials/stock.ts";
import { countOf } from "../../mockup/change.ts";
import type { Hardware, Layer } from "../../mockup/document.ts";
import { formatLengthWithUnit } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import type { PieceWithFigures } from "../joints.ts";
import type { Mend, MendStep } from "../mend.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords } from "../words.ts";

type CutLayer = { readonly layer: Layer; readonly pieces: readonly PieceWithFigures[] };

const source = "the shop's own stock list";
const mm2PerM2 = 1e6;

/** Rule 22: colours, thicknesses, sheets, hardware and wood that the shop has on hand. A list that is empty says nothing. */
export const stockOnHand: Rule = { number: 22, title: "Stock", check, mends };

function check(input: RuleInput): Finding[] {
  const cut = layersWithFigures(input).filter(({ pieces }) => pieces.length > 0);
  const listed = input.context.stock.acrylics.length > 0;
  return [
    ...(listed ? cut.flatMap((one) => checkSheet(one, input)) : []),
    ...sheetsToCount(cut, input).flatMap((one) => checkSheets(one, input)),
    ...checkHardware(input),
    ...checkWood(input),
  ];
}

const entryOf = ({ stock }: Layer, acrylics: readonly AcrylicStock[]) =>
  findEntry(acrylics, stock, ({ acrylic }) => acrylic);

function checkSheet({ layer, pieces }: CutLayer, { context }: RuleInput): Finding[] {
  const { acrylics } = context.stock;
  const mm = (length: number) => formatLengthWithUnit(length, context.unit);
  const base = {
    severity: "caution" as const,
    layerKey: layer.key,
    pieceIds: pieces.map(({ piece }) => piece.id),
    where: pieces[0]?.figures.centroid ?? null,
    source,
  };
  const entry = entryOf(layer, acrylics);
  if (!entry) {
    const nearest = nearestSheet({ ...layer.stock, thicknessMm: layer.thickness }, acrylics);
    const offer = nearest
      ? ` ${nearest.stock.name} in ${mm(nearest.thicknessMm)} comes nearest (CIEDE2000 ${nearest.deltaE.toFixed(1)}).`
      : ` Nothing on hand looks ${layer.stock.look}.`;
    return [
      foundBy(stockOnHand, {
        ...base,
        text: `${layer.stock.name} of ${layerWords(layer)} is not in the stock list.${offer}`,
      }),
    ];
  }
  const { thicknessesMm } = entry;
  if (hasThickness(thicknessesMm, layer.thickness)) return [];
  const there = thicknessesMm.length > 0 ? `it is there in ${thicknessesMm.map(mm).join(", ")}` : "it is there in none";
  return [
    foundBy(stockOnHand, {
      ...base,
      text: `${layerWords(layer)} takes ${layer.stock.name} in ${mm(layer.thickness)}, which is not in stock: ${there}.`,
      value: layer.thickness,
      limit: nearestThickness(thicknessesMm, layer.thickness),
      unit: "mm",
    }),
  ];
}

type SheetNeed = { readonly entry: AcrylicStock; readonly thicknessMm: number; readonly layers: CutLayer[] };

/** Layers by the sheet they are cut from, of whatever is in the stock list. */
function sheetsToCount(cut: readonly CutLayer[], { context }: RuleInput): SheetNeed[] {
  const needs: SheetNeed[] = [];
  for (const one of cut) {
    const entry = entryOf(one.layer, context.stock.acrylics);
    if (!entry) continue;
    const same = (need: SheetNeed) =>
      need.entry === entry && lengthsEqual(need.thicknessMm, one.layer.thickness, sameThicknessMm);
    const known = needs.find(same);
    if (known) known.layers.push(one);
    else needs.push({ entry, thicknessMm: one.layer.thickness, layers: [one] });
  }
  return needs;
}

/** The area of all sheets of one colour and thickness on hand, mm²; null until each of them has been counted. */
function areaOnHand({ sheets }: AcrylicStock, thicknessMm: number): { areaMm2: number; count: number } | null {
  const cut = sheets.filter((sheet) => lengthsEqual(sheet.thicknessMm, thicknessMm, sameThicknessMm));
  if (cut.length === 0) return null;
  let areaMm2 = 0;
  let count = 0;
  for (const { widthMm, heightMm, quantity } of cut) {
    if (quantity === null) return null;
    areaMm2 += widthMm * heightMm * quantity;
    count += quantity;
  }
  return { areaMm2, count };
}

function checkSheets({ entry, thicknessMm, layers }: SheetNeed, { document, limits, context }: RuleInput): Finding[] {
  const onHand = areaOnHand(entry, thicknessMm);
  const [first] = layers;
  if (!onHand || !first) return [];
  const areaMm2 = layers.flatMap(({ pieces }) => pieces).reduce((sum, { figures }) => sum + figures.areaMm2, 0);
  const needed = (areaMm2 * document.quantity) / limits.sheetShare;
  if (needed <= onHand.areaMm2) return [];
  const m2 = (area: number) => (area / mm2PerM2).toFixed(2);
  const signs = document.quantity === 1 ? "The sign takes" : `${document.quantity} signs take`;
  return [
    foundBy(stockOnHand, {
      severity: "caution",
      text: `${signs} about ${m2(needed)} m² of ${entry.acrylic.name}, ${formatLengthWithUnit(thicknessMm, context.unit)}, waste included (${layers.map(({ layer }) => layer.key).join(", ")}); ${m2(onHand.areaMm2)} m² are on hand in ${countOf(onHand.count, "sheet")}.`,
      layerKey: layers.length === 1 ? first.layer.key : null,
      where: first.pieces[0]?.figures.centroid ?? null,
      value: needed / mm2PerM2,
      limit: onHand.areaMm2 / mm2PerM2,
      unit: "m²",
      source,
    }),
  ];
}

type HardwareNeed = { readonly hardware: Hardware; readonly layer: Layer; count: number };

function checkHardware({ document, context }: RuleInput): Finding[] {
  const listed = context.stock.hardware;
  if (listed.length === 0) return [];
  const needs = new Map<string, HardwareNeed>();
  for (const layer of document.layers) {
    const { hold } = layer;
    if (hold.kind !== "standoff" || hold.holes.length === 0) continue;
    const key = hold.hardware.stockId ?? hold.hardware.name;
    const need = needs.get(key) ?? { hardware: hold.hardware, layer, count: 0 };
    need.count += hold.holes.length * document.quantity;
    needs.set(key, need);
  }
  return [...needs.values()].flatMap(({ hardware, layer, count }): Finding[] => {
    const entry = findEntry(listed, hardware, (one) => one.hardware);
    const hole = layer.hold.kind === "standoff" ? layer.hold.holes[0] : undefined;
    const base = {
      severity: "caution" as const,
      layerKey: layer.key,
      where: hole ? { x: hole.x, y: hole.y } : null,
      value: count,
      source,
    };
    const signs = document.quantity === 1 ? "The sign takes" : `${document.quantity} signs take`;
    if (!entry) {
      const text = `${signs} ${count} of ${hardware.name}, which is not in the stock list.`;
      return [foundBy(stockOnHand, { ...base, text, limit: 0 })];
    }
    if (entry.quantity === null || entry.quantity >= count) return [];
    const text = `${signs} ${count} of ${hardware.name}; ${entry.quantity} ${entry.quantity === 1 ? "is" : "are"} on hand.`;
    return [foundBy(stockOnHand, { ...base, text, limit: entry.quantity })];
  });
}

/** A board is planed down to its thickness, so only a thicker one than the shop has is missing. */
function checkWood({ document, context }: RuleInput): Finding[] {
  const { woods } = context.stock;
  const { stock, thickness } = document.backer;
  if (woods.length === 0) return [];
  const mm = (length: number) => formatLengthWithUnit(length, context.unit);
  const base = { severity: "caution" as const, source };
  const entry = findEntry(woods, stock, ({ wood }) => wood);
  if (!entry) return [foundBy(stockOnHand, { ...base, text: `${stock.name} of the backer is not in the stock list.` })];
  const thickest = Math.max(0, ...entry.thicknessesMm);
  if (thickness <= thickest + sameThicknessMm) return [];
  const text = `The backer takes ${stock.name} in ${mm(thickness)}; the thickest in stock is ${mm(thickest)}.`;
  return [foundBy(stockOnHand, { ...base, text, value: thickness, limit: thickest, unit: "mm" })];
}

/** The nearest thickness of the same sheet, or the nearest sheet. What is too few is bought, not drawn. */
function mends(finding: Finding, input: RuleInput): Mend[] {
  const { document, context } = input;
  const layer = document.layers.find(({ key }) => key === finding.layerKey);
  if (!layer || finding.pieceIds.length === 0) return [];
  const mm = (length: number) => formatLengthWithUnit(length, context.unit);
  const { acrylics } = context.stock;
  const entry = entryOf(layer, acrylics);
  if (entry && hasThickness(entry.thicknessesMm, layer.thickness)) return [];
  const thinner = entry ? nearestThickness(entry.thicknessesMm, layer.thickness) : null;
  const sameSheet: Mend[] =
    thinner === null
      ? []
      : [
          {
            label: `Take it in ${mm(thinner)}`,
            steps: [{ kind: "thickness", layerKey: layer.key, thickness: thinner }],
          },
        ];
  const other = nearestSheet({ ...layer.stock, thicknessMm: layer.thickness }, acrylics);
  if (!other || other.stock === entry?.acrylic) return sameSheet;
  const thickness: MendStep[] = lengthsEqual(other.thicknessMm, layer.thickness)
    ? []
    : [{ kind: "thickness", layerKey: layer.key, thickness: other.thicknessMm }];
  const label = `Take ${other.stock.name} in ${mm(other.thicknessMm)}`;
  const otherSheet = {
    label,
    steps: [{ kind: "stock" as const, layerKey: layer.key, stock: other.stock }, ...thickness],
  };
  return [...sameSheet, otherSheet];
}
