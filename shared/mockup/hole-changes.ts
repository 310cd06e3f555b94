import { formatFine } from "../units/format-length.ts";
import { type Change, countOf, type Wording } from "./change.ts";
import type { Hole, Layer, MockupDocument } from "./document.ts";
import { layerWords } from "./layer-changes.ts";

/**
 * What changed about the holes of layers on standoffs, matched by id. A layer has one entry for each sort of change.
 */
export function listHoleChanges(before: MockupDocument, after: MockupDocument, { unit }: Wording): Change[] {
  const old = new Map(before.layers.map((layer) => [layer.key, layer]));
  return after.layers.flatMap((layer) => {
    const was = old.get(layer.key);
    if (!was || layer.hold.kind !== "standoff" || was.hold.kind !== "standoff") return [];
    return changesOfHoles(layer, was.hold.holes, layer.hold.holes, unit);
  });
}

function changesOfHoles(layer: Layer, was: readonly Hole[], is: readonly Hole[], unit: Wording["unit"]): Change[] {
  const old = new Map(was.map((hole) => [hole.id, hole]));
  const now = new Set(is.map((hole) => hole.id));
  const pairs = is.flatMap((hole) => {
    const before = old.get(hole.id);
    return before ? [{ before, hole }] : [];
  });
  const changes: Change[] = [];
  const say = (holes: readonly Hole[], words: string) => {
    const [first] = holes;
    if (!first) return;
    const text = `${layerWords(layer)}: ${countOf(holes.length, "hole")} ${words}`;
    changes.push({ kind: "holes", text, layerKey: layer.key, pieceIds: [], where: { x: first.x, y: first.y } });
  };
  say(
    is.filter((hole) => !old.has(hole.id)),
    "added",
  );
  say(
    was.filter((hole) => !now.has(hole.id)),
    "taken out",
  );
  say(
    pairs.filter(({ before, hole }) => before.x !== hole.x || before.y !== hole.y).map(({ hole }) => hole),
    "moved",
  );
  for (const { before, hole } of pairs) {
    if (before.diameter === hole.diameter) continue;
    say([hole], `${formatFine(before.diameter, unit)} wide becomes ${formatFine(hole.diameter, unit)}`);
  }
  say(
    pairs.filter(({ before, hole }) => !before.fixed && hole.fixed).map(({ hole }) => hole),
    "made the fixed one",
  );
  say(
    pairs.filter(({ before, hole }) => before.fixed && !hole.fixed).map(({ hole }) => hole),
    "given play",
  );
  return changes;
}
