import { type CutShape, type LaidShape, layShape } from "./cut-shape.ts";
import type { FillControl, Filler, Filling, Item, LaidCopy, OpenField } from "./filler.ts";
import { seededNumbers } from "./random.ts";
import { sidesAlongAxes } from "./rectangle-turns.ts";
import type { SheetField } from "./sheet-field.ts";
import { fillRoom, hairMm, type RectangleWay } from "./skyline.ts";

/** Orders that give nothing better before the search starts over from another one. */
const patience = 2000;
/** Progress is told at least every so much of the search. */
const tellingStep = 0.02;

type Outcome = { readonly laid: readonly LaidCopy[]; readonly left: readonly Item[]; readonly cost: number };

/** Fills rectangular fields with rectangles, a search over orders round a skyline. All sizes are grown by the gap. */
export function rectangleFiller(shapes: readonly CutShape[], gapMm: number): Filler {
  const waysByField = new Map<SheetField, { laid: LaidShape[][]; ways: RectangleWay[][] }>();
  const waysOn = (field: SheetField) => {
    const known = waysByField.get(field);
    if (known) return known;
    const laid = shapes.map((shape) =>
      sidesAlongAxes(shape, field.stock.grainTurn).map((turn) => layShape(shape, turn, false)),
    );
    const ways = laid.map((list) =>
      list.map(({ box }, way) => {
        const [long, wide] = field.along === "x" ? [box.width, box.height] : [box.height, box.width];
        return { long: long + gapMm, wide: wide + gapMm, way };
      }),
    );
    const made = { laid, ways };
    waysByField.set(field, made);
    return made;
  };

  const lay = (order: readonly Item[], open: readonly OpenField[], meter: { probes: number }): Outcome => {
    const laid: LaidCopy[] = [];
    const rest = order.map((_, index) => index);
    const kinds = order.map(({ shape }) => shape);
    for (const [on, { field }] of open.entries()) {
      if (rest.length === 0) break;
      const ways = waysOn(field);
      const room = roomOf(field, gapMm);
      for (const { rectangle, way, u, v } of fillRoom(rest, kinds, ways.ways, room, meter)) {
        const item = order[rectangle];
        const shape = item && ways.laid[item.shape]?.[way.way];
        if (!item || !shape) continue;
        const [x, y] = field.along === "x" ? [u, v] : [v, u];
        laid.push({ item, on, laid: shape, x: field.inner.x + x, y: field.inner.y + y });
      }
    }
    const left = rest.flatMap((index) => order[index] ?? []);
    return { laid, left, cost: costOf(laid, left, open, shapes) };
  };

  const fill = (items: readonly Item[], open: readonly OpenField[], control: FillControl): Filling => {
    const meter = { probes: 0 };
    const random = seededNumbers(control.seed);
    const starts = startingOrders(items, shapes).map((order) => ({ order, outcome: lay(order, open, meter) }));
    let current = starts.reduce((a, b) => (b.outcome.cost < a.outcome.cost ? b : a));
    let best = current.outcome;
    let since = 0;
    const least = items.reduce((sum, { shape }) => sum + (shapes[shape]?.areaMm2 ?? 0), 0);
    let spent = 0;
    let told = 0;
    while (spent < control.probes && items.length > 1 && best.cost > least * (1 + 1e-9) && !control.shouldStop()) {
      const before = meter.probes;
      const order = since > patience ? shuffledOrder(items, shapes, random) : changedOrder(current.order, random);
      const outcome = lay(order, open, meter);
      // Moving the order about costs as much as some looks.
      spent += meter.probes - before + items.length;
      if (outcome.cost < current.outcome.cost - 1e-9 || since > patience) {
        since = 0;
        current = { order, outcome };
      } else {
        if (outcome.cost <= current.outcome.cost + 1e-9) current = { order, outcome };
        since++;
      }
      const isBetter = outcome.cost < best.cost - 1e-9;
      if (isBetter) best = outcome;
      const done = Math.min(1, spent / control.probes);
      if (isBetter || done >= told + tellingStep) {
        told = done;
        control.onProgress(done, best);
      }
    }
    return best;
  };

  return {
    fill,
    probesPerSecond: 4_000_000,
    fits: (shape, field) =>
      (waysOn(field).ways[shape] ?? []).some(({ long, wide }) => {
        const room = roomOf(field, gapMm);
        return long <= room.long + hairMm && wide <= room.wide + hairMm;
      }),
  };
}

/** A gap more than the field has, since the last rectangle needs none behind it. */
function roomOf({ inner, along }: SheetField, gapMm: number) {
  const [long, wide] = along === "x" ? [inner.width, inner.height] : [inner.height, inner.width];
  return { long: long + gapMm, wide: wide + gapMm };
}

const leftPenalty = 20;

/** What the sheets lose in mm²: all of a field, of the last only up to the last rectangle. */
function costOf(
  laid: readonly LaidCopy[],
  left: readonly Item[],
  open: readonly OpenField[],
  shapes: readonly CutShape[],
): number {
  const last = laid.reduce((most, { on }) => Math.max(most, on), 0);
  let cost = 0;
  for (const { field } of open.slice(0, last)) cost += field.areaMm2;
  const field = open[last]?.field;
  if (field) {
    const { box, along, areaMm2 } = field;
    let end = 0;
    for (const { on, laid: way, x, y } of laid) {
      if (on !== last) continue;
      end = Math.max(end, along === "x" ? x + way.box.width - box.x : y + way.box.height - box.y);
    }
    cost += (areaMm2 * end) / (along === "x" ? box.width : box.height);
  }
  for (const { shape } of left) cost += leftPenalty * (shapes[shape]?.areaMm2 ?? 0) + 1;
  return cost;
}

type Key = (shape: CutShape) => number;
const width: Key = ({ region }) => spread(region.flat().map(({ x }) => x));
const height: Key = ({ region }) => spread(region.flat().map(({ y }) => y));
const keys: readonly Key[] = [(shape) => shape.areaMm2, width, height, (shape) => width(shape) + height(shape)];

function spread(values: readonly number[]): number {
  return Math.max(...values) - Math.min(...values);
}

function startingOrders(items: readonly Item[], shapes: readonly CutShape[]): Item[][] {
  return keys.map((key) => sorted(items, (item) => keyOf(shapes[item.shape], key)));
}

function shuffledOrder(items: readonly Item[], shapes: readonly CutShape[], random: () => number): Item[] {
  const key = keys[Math.floor(random() * keys.length)] ?? width;
  return sorted(items, (item) => keyOf(shapes[item.shape], key) * (0.7 + 0.6 * random()));
}

const keyOf = (shape: CutShape | undefined, key: Key): number => (shape ? key(shape) : 0);

function sorted(items: readonly Item[], key: (item: Item) => number): Item[] {
  return items
    .map((item) => ({ item, key: key(item) }))
    .sort((a, b) => b.key - a.key || a.item.index - b.item.index)
    .map(({ item }) => item);
}

function changedOrder(order: readonly Item[], random: () => number): Item[] {
  const changed = [...order];
  const from = Math.floor(random() * changed.length);
  const to = Math.floor(random() * changed.length);
  const [a, b] = [changed[from], changed[to]];
  if (!a || !b) return changed;
  if (random() < 0.5) {
    changed[from] = b;
    changed[to] = a;
  } else {
    changed.splice(from, 1);
    changed.splice(to, 0, a);
  }
  return changed;
}
