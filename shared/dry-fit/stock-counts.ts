import { lengthsEqual } from "../geometry/tolerance.ts";
import { findEntry, sameThicknessMm } from "../materials/find-stock.ts";
import type { AcrylicStock } from "../materials/stock.ts";
import { countOf } from "../mockup/change.ts";
import type { Hardware, Layer } from "../mockup/document.ts";
import { formatFine } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { Finding } from "./finding.ts";
import type { PieceWithFigures } from "./joints.ts";
import { foundBy, type RuleInput } from "./rule.ts";

export const stockRule = { number: 22, title: "Stock" } as const;
export const stockSource = "the shop's own stock list";

/** A layer with pieces to cut. */
export type CutLayer = { readonly layer: Layer; readonly pieces: readonly PieceWithFigures[] };

const mm2PerM2 = 1e6;
const mm2PerSquareFoot = 304.8 ** 2;

function areaWords(mm2: number, unit: LengthUnit): string {
  if (unit === "mm")
    return mm2 < mm2PerM2 / 100 ? `${(mm2 / 100).toFixed(1)} cm²` : `${(mm2 / mm2PerM2).toFixed(2)} m²`;
  return mm2 < mm2PerSquareFoot / 10
    ? `${(mm2 / 25.4 ** 2).toFixed(1)} in²`
    : `${(mm2 / mm2PerSquareFoot).toFixed(1)} ft²`;
}

/** The entry of the stock list that a layer's sheet is; null when it is not in it. */
export const entryOf = ({ stock }: Layer, acrylics: readonly AcrylicStock[]): AcrylicStock | null =>
  findEntry(acrylics, stock, ({ acrylic }) => acrylic);

/** Sheets, standoffs and wood of which there are too few for all signs, or none thick enough. */
export function checkCounts(cut: readonly CutLayer[], input: RuleInput): Finding[] {
  return [
    ...sheetsToCount(cut, input).flatMap((one) => checkSheets(one, input)),
    ...checkHardware(input),
    ...checkWood(input),
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
  const area = (mm2: number) => areaWords(mm2, context.unit);
  const signs = document.quantity === 1 ? "The sign takes" : `${document.quantity} signs take`;
  return [
    foundBy(stockRule, {
      severity: "caution",
      text: `${signs} about ${area(needed)} of ${entry.acrylic.name}, ${formatFine(thicknessMm, context.unit)}, for ${layers.map(({ layer }) => layer.key).join(", ")}, waste included; ${onHand.count === 0 ? "no sheet of it is on hand" : `${area(onHand.areaMm2)} are on hand in ${countOf(onHand.count, "sheet")}`}.`,
      layerKey: layers.length === 1 ? first.layer.key : null,
      where: first.pieces[0]?.figures.centroid ?? null,
      value: needed / mm2PerM2,
      limit: onHand.areaMm2 / mm2PerM2,
      unit: "m²",
      source: stockSource,
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
      source: stockSource,
    };
    const signs = document.quantity === 1 ? "The sign takes" : `${document.quantity} signs take`;
    if (!entry) {
      const text = `${signs} ${count} of ${hardware.name}, which is not in the stock list.`;
      return [foundBy(stockRule, { ...base, text, limit: 0 })];
    }
    if (entry.quantity === null || entry.quantity >= count) return [];
    const text = `${signs} ${count} of ${hardware.name}; ${entry.quantity} ${entry.quantity === 1 ? "is" : "are"} on hand.`;
    return [foundBy(stockRule, { ...base, text, limit: entry.quantity })];
  });
}

/** Wood is planed down to its thickness, so only a thicker one than the shop has is missing. */
function checkWood({ document, context }: RuleInput): Finding[] {
  const { woods } = context.stock;
  const { backer, frame } = document;
  if (woods.length === 0) return [];
  const mm = (length: number) => formatFine(length, context.unit);
  const parts = [
    { part: backer.slats ? "substrate" : "backer", stock: backer.stock, thicknessMm: backer.thickness },
    ...(backer.slats ? [{ part: "slats", stock: backer.slats.stock, thicknessMm: backer.slats.thickness }] : []),
    // A frame's stick lies either way up.
    ...(frame ? [{ part: "frame", stock: frame.stock, thicknessMm: Math.min(frame.width, frame.depth) }] : []),
  ];
  return parts.flatMap(({ part, stock, thicknessMm }): Finding[] => {
    const base = { severity: "caution" as const, source: stockSource };
    const entry = findEntry(woods, stock, ({ wood }) => wood);
    if (!entry) {
      return [foundBy(stockRule, { ...base, text: `${stock.name} of the ${part} is not in the stock list.` })];
    }
    const thickest = Math.max(0, ...entry.thicknessesMm);
    if (thicknessMm <= thickest + sameThicknessMm) return [];
    const text = `For the ${part} the sign takes ${stock.name} in ${mm(thicknessMm)}; the thickest in stock is ${mm(thickest)}.`;
    return [foundBy(stockRule, { ...base, text, value: thicknessMm, limit: thickest, unit: "mm" })];
  });
}
