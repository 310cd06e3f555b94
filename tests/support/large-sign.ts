import type { Path, Segment } from "#shared/geometry/path.ts";
import { standardAcrylics, standardStandoffs } from "#shared/materials/standard-stock.ts";
import type { Acrylic, Layer, MockupDocument } from "#shared/mockup/document.ts";
import { bondHold, buildLayer, buildPiece, buildSign, hole, plate, standoffHold } from "./build-sign.ts";
import { seededRandom } from "./seeded-random.ts";

const present = <T>(one: T | undefined): T => {
  if (one === undefined) throw new Error("The standard stock is too short.");
  return one;
};

/** A wavy blossom of `nodes` nodes, half of its segments curves. */
function blossom(nodes: number, radius: number, lobes: number): Path {
  const at = (index: number) => {
    const angle = (index / nodes) * 2 * Math.PI;
    const reach = radius * (0.8 + 0.2 * Math.cos(lobes * angle));
    return { x: reach * Math.cos(angle), y: reach * Math.sin(angle) };
  };
  const segments = Array.from({ length: nodes }, (_, index): Segment => {
    const [from, to] = [at(index), at(index + 1)];
    if (index % 2 === 0) return { kind: "line", to };
    const third = (share: number) => ({ x: from.x + (to.x - from.x) * share, y: from.y + (to.y - from.y) * share });
    return { kind: "cubic", c1: third(1 / 3), c2: third(2 / 3), to };
  });
  return [{ start: at(0), segments }];
}

/**
 * A sign of 300 pieces and some 20,000 nodes: a panel on four standoffs, 180 pieces bonded to it, 80 on those, and 39
 * beside it on the board. The same at every call.
 */
export function largeSign(): MockupDocument {
  const random = seededRandom(300);
  const stock = (index: number): Acrylic => present(standardAcrylics[index]).acrylic;
  const bonded = (key: string, index: number, pieces: Layer["pieces"]) =>
    buildLayer(key, pieces, { stock: stock(index), hold: bondHold, marked: "back" });
  const spread = (
    name: string,
    count: number,
    columns: number,
    box: { x: number; y: number; step: number },
    radius: number,
  ) =>
    Array.from({ length: count }, (_, index) =>
      buildPiece(`${name}-${index}`, blossom(68, radius * (0.8 + 0.2 * random()), 5 + (index % 4)), {
        at: [box.x + (index % columns) * box.step, box.y + Math.floor(index / columns) * box.step],
        name: `${name} ${index + 1}`,
      }),
    );
  return buildSign(
    [
      buildLayer("B", [plate("panel", 840, 540, [450, 300])], {
        stock: stock(0),
        thickness: 4.5,
        marked: "back",
        hold: standoffHold(
          [
            hole("h1", 45, 45, { diameter: 6, fixed: true }),
            hole("h2", 855, 45),
            hole("h3", 45, 555),
            hole("h4", 855, 555),
          ],
          present(standardStandoffs[1]),
        ),
      }),
      bonded("C", 1, spread("Leaf", 180, 18, { x: 78, y: 78, step: 44 }, 19)),
      bonded("D", 2, spread("Bud", 80, 16, { x: 78, y: 78, step: 44 }, 8)),
      bonded("E", 3, spread("Dot", 39, 39, { x: 1000, y: 20, step: 14 }, 6)),
    ],
    { board: { outline: { kind: "rectangle" }, width: 1600, height: 600, measures: "body" } },
  );
}
