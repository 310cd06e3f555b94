import type { Path } from "#shared/geometry/path.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";
import {
  standardAcrylics,
  standardAdhesives,
  standardHardware,
  standardStandoffs,
  standardWoods,
} from "#shared/materials/standard-stock.ts";
import {
  type CapStud,
  documentSchema,
  type Hardware,
  type Hold,
  type Hole,
  type Layer,
  type MockupDocument,
  type Piece,
} from "#shared/mockup/document.ts";
import { emptyDocument } from "#shared/mockup/empty-document.ts";

/** Signs of simple shapes with round numbers, so that a test can say what it expects without computing it. */

function first<T>(list: readonly T[]): T {
  const [one] = list;
  if (one === undefined) throw new Error("The standard stock is empty.");
  return one;
}

const changeable = (path: Path): Piece["path"] =>
  path.map(({ start, segments }) => ({ start, segments: [...segments] }));

/** A piece whose origin is the middle of its path. */
export function buildPiece(id: string, path: Path, overrides: Partial<Piece> & { at?: [number, number] } = {}): Piece {
  const { at = [0, 0], ...rest } = overrides;
  return {
    id,
    name: "",
    source: { kind: "plate" },
    path: changeable(path),
    placement: { x: at[0], y: at[1], turn: 0, scale: 1, mirrored: false },
    reads: "",
    ...rest,
  };
}

/** A rectangle of that size with its middle at `at`. */
export const plate = (id: string, width: number, height: number, at: [number, number], rest: Partial<Piece> = {}) =>
  buildPiece(id, rectanglePath({ x: -width / 2, y: -height / 2, width, height }), { at, ...rest });

/** A disc with its middle at `at`. */
export const disc = (id: string, radius: number, at: [number, number], rest: Partial<Piece> = {}) =>
  buildPiece(id, circlePath({ x: 0, y: 0 }, radius), { at, ...rest });

/** Holds on acrylic and on wood, and gives with both. */
const tape = (() => {
  const found = standardAdhesives.find(({ family }) => family === "high-bond tape");
  if (!found) throw new Error("The standard stock has no tape.");
  return found;
})();

export const bondHold: Hold = { kind: "bond", adhesive: tape, tack: null };

export const pocketHold = (depth: number, clearance = 0): Hold => ({
  kind: "pocket",
  depth,
  clearance,
  adhesive: tape,
  cut: "engraved",
  bitRadius: 0,
});

/** 15 mm barrels, 12 mm long, 5 mm stud, unless overridden. */
export const buildCapStud = (overrides: Partial<CapStud> = {}): CapStud => ({
  ...first(standardStandoffs),
  ...overrides,
});

/** The first of its kind in the standard stock, 12 mm high: a spacer of 12, a stud of 10, a holder of 16 mm. */
export function buildHardware<K extends Hardware["kind"]>(
  kind: K,
  overrides: Partial<Extract<Hardware, { kind: K }>> = {},
): Extract<Hardware, { kind: K }> {
  const found = standardHardware.find(
    (one): one is Extract<Hardware, { kind: K }> => one.kind === kind && one.barrelLength === 12,
  );
  if (!found) throw new Error(`The standard stock has no ${kind}.`);
  return { ...found, ...overrides };
}

export const hole = (id: string, x: number, y: number, rest: Partial<Hole> = {}): Hole => ({
  id,
  x,
  y,
  diameter: 8,
  fixed: false,
  ...rest,
});

export const standoffHold = (holes: Hole[], hardware: Hardware = buildCapStud(), offset?: number): Hold => ({
  kind: "standoff",
  hardware,
  offset: offset ?? hardware.barrelLength,
  holes,
});

/** A bonded layer of 3 mm cast acrylic in the first stock colour, located by a template, unless overridden. */
export function buildLayer(key: string, pieces: Piece[], overrides: Partial<Layer> = {}): Layer {
  return {
    key,
    name: `Layer ${key}`,
    stock: first(standardAcrylics).acrylic,
    thickness: 3,
    hold: bondHold,
    locate: "template",
    pieces,
    marked: "not stated",
    hidden: false,
    locked: false,
    ...overrides,
  };
}

/** A pine board of 600 by 400 by 18 mm with these layers. Throws when it breaks the schema. */
export function buildSign(layers: Layer[], overrides: Partial<MockupDocument> = {}): MockupDocument {
  const document = emptyDocument({ backer: first(standardWoods).wood });
  return documentSchema.parse({ ...document, layers, ...overrides });
}
