import { boxCentre, boxOfPath, boxUnion } from "../geometry/box.ts";
import type { Point } from "../geometry/path.ts";
import { placePath } from "../geometry/placement.ts";
import { formatLengthWithUnit } from "../units/format-length.ts";
import { type Change, countOf, sameThing, type Wording } from "./change.ts";
import type { Hold, Layer, MockupDocument } from "./document.ts";

/** What changed about layers as a whole: come, gone, name, stock, thickness, hold, offset, order. */
export function listLayerChanges(before: MockupDocument, after: MockupDocument, wording: Wording): Change[] {
  const changes: Change[] = [];
  const old = new Map(before.layers.map((layer) => [layer.key, layer]));
  for (const layer of after.layers) {
    const was = old.get(layer.key);
    if (was) changes.push(...changesOfLayer(was, layer, wording));
    else changes.push(onLayer(layer, "come", `new layer of ${layer.stock.name}, ${pieces(layer)}`));
  }
  const kept = new Set(after.layers.map((layer) => layer.key));
  const keptPieces = new Set(after.layers.flatMap((layer) => layer.pieces.map((piece) => piece.id)));
  for (const layer of before.layers) {
    if (kept.has(layer.key)) continue;
    const lost = layer.pieces.filter((piece) => !keptPieces.has(piece.id));
    changes.push(onLayer(layer, "gone", `the layer is gone, with ${countOf(lost.length, "piece")}`));
  }
  const order = (document: MockupDocument, other: ReadonlyMap<string, Layer>) =>
    document.layers.map(({ key }) => key).filter((key) => other.has(key));
  const was = order(before, new Map(after.layers.map((layer) => [layer.key, layer]))).join(", ");
  const is = order(after, old).join(", ");
  if (was !== is) {
    const text = `Order from the wall outward: ${was} becomes ${is}`;
    changes.push({ kind: "order", text, layerKey: null, pieceIds: [], where: null });
  }
  return changes;
}

/** The layer in words: its key and its name. */
export const layerWords = ({ key, name }: Pick<Layer, "key" | "name">): string => `${key}, ${name}`;

/** The hold in words, as the schedule says it. */
export function holdWords(hold: Hold, { unit }: Wording): string {
  const length = (mm: number) => formatLengthWithUnit(mm, unit);
  switch (hold.kind) {
    case "bond":
      return `bonded with ${hold.tack ? `${hold.tack.name}, then ` : ""}${hold.adhesive.name}`;
    case "pocket":
      return `let in ${length(hold.depth)} deep with ${hold.adhesive.name}`;
    case "standoff":
      return `on ${hold.hardware.name}`;
  }
}

function changesOfLayer(was: Layer, is: Layer, wording: Wording): Change[] {
  const changes: Change[] = [];
  const say = (kind: Change["kind"], text: string) => changes.push(onLayer(is, kind, text));
  const length = (mm: number) => formatLengthWithUnit(mm, wording.unit);
  if (was.name !== is.name) say("layer", `called ${was.name} before`);
  if (was.stock.name !== is.stock.name) say("colour", `${was.stock.name} becomes ${is.stock.name}`);
  else if (was.stock.colour !== is.stock.colour) {
    say("colour", `${is.stock.name}: ${was.stock.colour} becomes ${is.stock.colour}`);
  } else if (was.stock.look !== is.stock.look) say("colour", `${was.stock.look} becomes ${is.stock.look}`);
  else if (was.stock.process !== is.stock.process)
    say("layer", `${was.stock.process} sheet becomes ${is.stock.process}`);
  else if (!sameThing(was.stock, is.stock)) say("layer", `${is.stock.name}: other properties of the sheet`);
  if (was.thickness !== is.thickness)
    say("thickness", `thickness ${length(was.thickness)} becomes ${length(is.thickness)}`);
  changes.push(...changesOfHold(was.hold, is, wording));
  if (was.locate !== is.locate) say("hold", `place found by ${locateWords(was)} becomes ${locateWords(is)}`);
  if (was.marked !== is.marked) say("layer", `film marked on the ${was.marked} becomes on the ${is.marked}`);
  if (was.hidden !== is.hidden) say("layer", is.hidden ? "hidden in the mockup" : "shown in the mockup again");
  return changes;
}

function changesOfHold(was: Hold, layer: Layer, wording: Wording): Change[] {
  const is = layer.hold;
  const changes: Change[] = [];
  const [before, after] = [holdWords(was, wording), holdWords(is, wording)];
  if (before !== after) changes.push(onLayer(layer, "hold", `${before} becomes ${after}`));
  else if (
    !sameThing(withoutHoles(was), withoutHoles(is)) &&
    !(was.kind === "standoff" && is.kind === "standoff" && sameThing(was.hardware, is.hardware))
  ) {
    changes.push(onLayer(layer, "hold", `${after}: other measures`));
  }
  if (was.kind === "standoff" && is.kind === "standoff" && was.offset !== is.offset) {
    const [from, to] = [was.offset, is.offset].map((mm) => formatLengthWithUnit(mm, wording.unit));
    changes.push(onLayer(layer, "offset", `offset ${from} becomes ${to}`));
  }
  return changes;
}

function withoutHoles(hold: Hold): unknown {
  return hold.kind === "standoff" ? { ...hold, holes: [], offset: 0 } : hold;
}

const locateWords = ({ locate }: Layer): string => (locate === "none" ? "nothing" : locate);
const pieces = (layer: Layer): string => countOf(layer.pieces.length, "piece");

function onLayer(layer: Layer, kind: Change["kind"], text: string): Change {
  return {
    kind,
    text: `${layerWords(layer)}: ${text}`,
    layerKey: layer.key,
    pieceIds: layer.pieces.map((piece) => piece.id),
    where: middleOf(layer),
  };
}

function middleOf(layer: Layer): Point | null {
  const box = boxUnion(layer.pieces.map((piece) => boxOfPath(placePath(piece.path, piece.placement))));
  return box && boxCentre(box);
}
