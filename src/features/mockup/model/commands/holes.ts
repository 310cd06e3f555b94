import type { Point } from "#shared/geometry/path.ts";
import { passingDiameterMm } from "#shared/hardware/standoff-parts.ts";
import type { Hole, Layer, MockupDocument } from "#shared/mockup/document.ts";
import { coordinateOf, exactCoordinateOf, lengthOf, mostHoles } from "../limits.ts";
import { fitDiameters, propose, type Site } from "../propose-holes.ts";
import { isSame, withFields } from "../same.ts";
import { changeLayer, changeLayers } from "./change-layer.ts";

type Where = { readonly key: string; readonly site: Site };

/** Puts a hole into a standoff layer, as wide as its window asks for. The first one is the fixed one. */
export function addHole(
  document: MockupDocument,
  { key, id, x, y, site }: Where & { id: string } & Point,
): MockupDocument {
  const holeX = coordinateOf(x);
  const holeY = coordinateOf(y);
  if (holeX === null || holeY === null) return document;
  return changeHoles(document, key, (hold) => {
    if (hold.holes.length >= mostHoles) return hold.holes;
    const added = {
      id,
      x: holeX,
      y: holeY,
      diameter: passingDiameterMm(hold.hardware),
      fixed: hold.holes.length === 0,
    };
    const holes = [...hold.holes, added];
    const fitted = fitDiameters({ ...hold, holes }, { document, site }).at(-1) ?? added;
    return [...hold.holes, fitted];
  });
}

/** Gives every hole of a layer a diameter that has play and hides under the cap, where there is one. */
export function fitHoles(document: MockupDocument, { key, site }: Where): MockupDocument {
  return changeHoles(document, key, (hold) => fitDiameters(hold, { document, site }));
}

/** Sets a hole's place and diameter in mm. */
export function setHole(
  document: MockupDocument,
  { holeId, ...fields }: { holeId: string; x?: number; y?: number; diameter?: number },
): MockupDocument {
  return changeHolesOfAll(document, ({ holes }) =>
    holes.map((hole) =>
      hole.id === holeId
        ? withFields(hole, {
            x: exactCoordinateOf(fields.x ?? hole.x) ?? hole.x,
            y: exactCoordinateOf(fields.y ?? hole.y) ?? hole.y,
            diameter: lengthOf(fields.diameter ?? hole.diameter) ?? hole.diameter,
          })
        : hole,
    ),
  );
}

/** Takes a hole out. When it was the fixed one, the next hole of the layer becomes it. */
export function removeHole(document: MockupDocument, { holeId }: { holeId: string }): MockupDocument {
  return changeHolesOfAll(document, ({ holes }) => {
    const left = holes.filter((hole) => hole.id !== holeId);
    const [first, ...rest] = left;
    if (left.length === holes.length || !first || left.some((hole) => hole.fixed)) return left;
    return [{ ...first, fixed: true }, ...rest];
  });
}

/** Makes one hole of a layer the fixed one, from which the others move. */
export function fixHole(document: MockupDocument, { holeId }: { holeId: string }): MockupDocument {
  return changeHolesOfAll(document, ({ holes }) =>
    holes.some((hole) => hole.id === holeId)
      ? holes.map((hole) => withFields(hole, { fixed: hole.id === holeId }))
      : holes,
  );
}

/** Replaces a layer's holes by ones towards the corners of its pieces, with ids made from `id`. */
export function proposeHoles(document: MockupDocument, { key, id, site }: Where & { id: string }): MockupDocument {
  return changeLayer(document, key, (layer) =>
    withHoles(layer, ({ hardware }) => propose(layer, { hardware, id, document, site })),
  );
}

type Standoffs = Extract<Layer["hold"], { kind: "standoff" }>;
type ChangeHoles = (hold: Standoffs) => readonly Hole[];

function changeHoles(document: MockupDocument, key: string, change: ChangeHoles): MockupDocument {
  return changeLayer(document, key, (layer) => withHoles(layer, change));
}

function changeHolesOfAll(document: MockupDocument, change: ChangeHoles): MockupDocument {
  return changeLayers(document, (layer) => withHoles(layer, change));
}

function withHoles(layer: Layer, change: ChangeHoles): Layer {
  if (layer.hold.kind !== "standoff") return layer;
  const holes = change(layer.hold);
  return isSame(holes, layer.hold.holes) ? layer : { ...layer, hold: { ...layer.hold, holes: [...holes] } };
}
