import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import type { Path } from "#shared/geometry/path.ts";
import { circlePath } from "#shared/geometry/shapes.ts";
import { pathTransform, translateMatrix } from "#shared/geometry/transform.ts";
import {
  standardAcrylics,
  standardAdhesives,
  standardStandoffs,
  standardWoods,
} from "#shared/materials/standard-stock.ts";
import type {
  Acrylic,
  Adhesive,
  CapStud,
  Coat,
  Hold,
  Layer,
  MockupDocument,
  Piece,
  Wood,
} from "#shared/mockup/document.ts";
import { emptyDocument } from "#shared/mockup/empty-document.ts";

/** What the demo's documents are put together from: the standard stock, found by name. */
function named<T>(list: readonly T[], name: string, nameOf: (one: T) => string): T {
  const found = list.find((one) => nameOf(one) === name);
  if (!found) throw new Error(`The standard stock has no ${name}.`);
  return found;
}
export const acrylic = (name: string): Acrylic => named(standardAcrylics, name, (one) => one.acrylic.name).acrylic;
export const standoff = (name: string): CapStud => named(standardStandoffs, name, (one) => one.name);
const adhesive = (name: string): Adhesive => named(standardAdhesives, name, (one) => one.name);

export const bondToAcrylic: Hold = { kind: "bond", adhesive: adhesive("Wicking cement"), tack: null };
export const bondToWood: Hold = { kind: "bond", adhesive: adhesive("Slow epoxy"), tack: null };

const sanded: Coat = { kind: "sanding", grit: 180 };
export const paleWash: Coat[] = [
  sanded,
  { kind: "stain", name: "Pale wash", colour: "#F2E9D8", strength: 0.25, dryingHours: 6 },
  { kind: "clear coat", name: "Clear satin", base: "water-borne", dryingHours: 2 },
  { kind: "clear coat", name: "Clear satin", base: "water-borne", dryingHours: 12 },
];
export const hardOil: Coat[] = [
  sanded,
  { kind: "clear coat", name: "Hard oil", base: "oil or shellac", dryingHours: 24 },
];
export const clearCoat: Coat[] = [
  sanded,
  { kind: "clear coat", name: "Clear matt", base: "water-borne", dryingHours: 12 },
];

export function board(size: {
  width: number;
  height: number;
  wood: string;
  thickness: number;
  finish: Coat[];
}): MockupDocument {
  const { wood } = named(standardWoods, size.wood, (one) => one.wood.name);
  const empty = emptyDocument({
    backer: wood,
    widthMm: size.width,
    heightMm: size.height,
    thicknessMm: size.thickness,
  });
  return {
    ...empty,
    backer: { ...empty.backer, finish: size.finish },
    hanging: { ...empty.hanging, kind: "cleat", gap: 12, carriesKg: 20 },
  };
}

/** Veneers laid crosswise hold one another: it moves a tenth of what its wood does (from memory). */
export const birchPlywood: Wood = {
  kind: "wood",
  stockId: null,
  name: "Birch plywood",
  colour: "#DCC79C",
  gravity: 0.6,
  moisturePercent: 8,
  hardness: "hardwood",
  movementPerPoint: 0.0003,
};

/** A board laid with slats at 45 degrees, mitred to a spine; what it was a board of becomes the slats. */
export function slatted(
  document: MockupDocument,
  { thickness, slatWidth, substrate }: { thickness: number; slatWidth: number; substrate: number },
): MockupDocument {
  return {
    ...document,
    backer: {
      ...document.backer,
      stock: birchPlywood,
      thickness: substrate,
      slats: {
        stock: document.backer.stock,
        thickness,
        pattern: "spine",
        angle: 45,
        slatWidth,
        gap: 0,
        spineWidth: slatWidth,
        spineOffset: 0,
        start: { kind: "corner" },
        direction: "up",
        overhang: 30,
      },
    },
  };
}

type ArtworkOnBoard = {
  readonly artworkId: string;
  readonly pieces: readonly ArtworkPiece[];
  readonly at: { x: number; y: number };
};

/** The artwork's pieces of one colour, each about its own middle, with the artwork's upper left corner at `at` on the board. */
export function piecesOfColour({ artworkId, pieces, at }: ArtworkOnBoard, colour: string, name: string): Piece[] {
  return pieces
    .filter((piece) => piece.colour === colour)
    .map(({ index, path }, place) => {
      const { x, y, width, height } = boxOfPath(path) ?? { x: 0, y: 0, width: 0, height: 0 };
      const middle = { x: x + width / 2, y: y + height / 2 };
      return {
        id: `${artworkId.slice(0, 8)}-${index}`,
        name: `${name} ${place + 1}`,
        source: { kind: "artwork", artworkId, index, colour },
        path: changeable(pathTransform(path, translateMatrix(-middle.x, -middle.y))),
        placement: { x: at.x + middle.x, y: at.y + middle.y, turn: 0, scale: 1, mirrored: false },
        reads: "",
      };
    });
}

/** The letters of one line, from the left, each saying what it reads. */
export function reading(words: string, letters: readonly Piece[]): Piece[] {
  const characters = [...words.replaceAll(" ", "")];
  if (characters.length !== letters.length) throw new Error(`“${words}” is not ${letters.length} letters long.`);
  const inOrder = letters.toSorted((a, b) => a.placement.x - b.placement.x);
  return letters.map((letter) => ({ ...letter, reads: characters[inOrder.indexOf(letter)] ?? "" }));
}

/** A round plate. */
export function disc(id: string, name: string, { x, y, radius }: { x: number; y: number; radius: number }): Piece {
  return {
    id,
    name,
    source: { kind: "plate" },
    path: changeable(circlePath({ x: 0, y: 0 }, radius)),
    placement: { x, y, turn: 0, scale: 1, mirrored: false },
    reads: "",
  };
}

export function layer(one: {
  key: string;
  name: string;
  stock: string;
  thickness: number;
  hold: Hold;
  pieces: Piece[];
}): Layer {
  return {
    ...one,
    stock: acrylic(one.stock),
    locate: one.hold.kind === "standoff" ? "hole pattern" : "template",
    marked: "back",
    hidden: false,
    locked: false,
  };
}

/** Four standoffs at the corners of a square around a middle, the first one fixed, the others with play. */
export function fourStandoffs(
  hardware: CapStud,
  { x, y, reach, diameter }: { x: number; y: number; reach: number; diameter: number },
): Hold {
  const corners = [
    [-1, -1],
    [1, -1],
    [1, 1],
    [-1, 1],
  ] as const;
  return {
    kind: "standoff",
    hardware,
    offset: hardware.barrelLength,
    holes: corners.map(([dx, dy], index) => ({
      id: `hole-${index + 1}`,
      x: x + dx * reach,
      y: y + dy * reach,
      diameter,
      fixed: index === 0,
    })),
  };
}

const changeable = (path: Path): Piece["path"] =>
  path.map(({ start, segments }) => ({ start, segments: [...segments] }));
