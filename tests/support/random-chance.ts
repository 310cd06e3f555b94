import { rectanglePath } from "#shared/geometry/shapes.ts";
import type { Coat, Lettering, MockupDocument } from "#shared/mockup/document.ts";
import type { Shaped } from "#shared/shaping/shaped.ts";
import type { SetWords } from "@/features/mockup/model/commands/add-lettering.ts";
import type { PlateShape } from "@/features/mockup/model/commands/add-plate.ts";
import type { ArtworkToBringIn } from "@/features/mockup/model/commands/bring-in-artwork.ts";
import { togethers } from "@/features/mockup/model/together.ts";
import { barrel, brass, cement, chalk, epoxy, midnight } from "../unit/src/features/mockup/sample-mockup.ts";
import { inside } from "../unit/src/features/mockup/sites.ts";

/** What a command is given besides the document: chance, and ids that were never given before. */
export type Chance = {
  /** From 0 up to 1. */
  readonly next: () => number;
  readonly newId: () => string;
};

export const oneOf = <T>({ next }: Chance, list: readonly T[]): T => {
  const found = list[Math.floor(next() * list.length)];
  if (found === undefined) throw new Error("There is nothing to choose from.");
  return found;
};
export const isLikely = ({ next }: Chance, share = 0.5): boolean => next() < share;
/** Mostly what a hand would type, now and then what no field should take. */
export const number = (chance: Chance): number =>
  isLikely(chance, 0.9)
    ? Math.round((chance.next() * 700 - 60) * 100) / 100
    : oneOf(chance, [0, -1, 1e9, -20_000, 1e-9, Number.NaN, Number.POSITIVE_INFINITY]);
export const size = (chance: Chance): number => (isLikely(chance, 0.9) ? 1 + chance.next() * 300 : number(chance));
export const text = (chance: Chance): string =>
  oneOf(chance, ["Night disc", " Sun ", "", "Outer\u0000ring", "x".repeat(300), "Ö"]);
export const sheet = (chance: Chance) => oneOf(chance, [midnight, brass, chalk]);
export const glue = (chance: Chance) => oneOf(chance, [cement, epoxy]);
export const stud = (chance: Chance) => oneOf(chance, [barrel(12), barrel(19), barrel(25)]);
export const key = ({ layers }: MockupDocument, chance: Chance): string =>
  oneOf(chance, [...layers.map((layer) => layer.key), "ZZ"]);
export const pieceOf = ({ layers }: MockupDocument, chance: Chance): string =>
  oneOf(chance, [...layers.flatMap(({ pieces }) => pieces.map(({ id }) => id)), "no piece"]);
export const piecesOf = (document: MockupDocument, chance: Chance): string[] => [
  ...new Set(Array.from({ length: 1 + Math.floor(chance.next() * 4) }, () => pieceOf(document, chance))),
];
export const holeOf = ({ layers }: MockupDocument, chance: Chance): string =>
  oneOf(chance, [
    ...layers.flatMap(({ hold }) => (hold.kind === "standoff" ? hold.holes.map(({ id }) => id) : [])),
    "-",
  ]);
export const together = (chance: Chance) => oneOf(chance, togethers);

export const newLayer = (chance: Chance) => ({
  name: text(chance),
  stock: sheet(chance),
  thickness: oneOf(chance, [3, 4.5, 6]),
  hold: isLikely(chance)
    ? { kind: oneOf(chance, ["bond", "pocket"] as const), adhesive: glue(chance) }
    : { kind: "standoff" as const, hardware: stud(chance) },
  id: chance.newId(),
  site: inside,
});

export const shape = (chance: Chance): PlateShape =>
  oneOf<PlateShape>(chance, [
    { kind: "circle", diameter: size(chance) },
    { kind: "rectangle", width: size(chance), height: size(chance) },
    { kind: "ellipse", width: size(chance), height: size(chance) },
    { kind: "rounded", width: size(chance), height: size(chance), radius: size(chance) },
  ]);

/** What the kernel would have worked out: here a rectangle somewhere. */
export const shaped = (chance: Chance): Shaped => {
  const [width, height] = [1 + chance.next() * 90, 1 + chance.next() * 90];
  return {
    path: rectanglePath({ x: -width / 2, y: -height / 2, width, height }),
    placement: { x: chance.next() * 600, y: chance.next() * 400, turn: 0, scale: 1, mirrored: false },
  };
};

export const artworks: readonly ArtworkToBringIn[] = [
  "0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11",
  "6f1d3a52-8f0e-4c0b-9a51-0d3c5c1b7a10",
].map((artworkId, order) => ({
  artworkId,
  widthMm: 90 + order * 7,
  heightMm: 50,
  pieces: ["#111111", "#EEEEEE", "#111111"].map((colour, index) => {
    const box = { x: 30 * index + order, y: 3 * index, width: 25 - index, height: 20 + order };
    return { index, colour, path: rectanglePath(box), box, areaMm2: box.width * box.height };
  }),
}));

/** Words with a box for each letter, as a face would give an outline. */
export function words(chance: Chance, id: string): SetWords {
  const said = oneOf(chance, ["HERON", "AB", "A\nB", "WEIR & CO"]);
  const capHeight = 10 + Math.round(chance.next() * 40);
  const lettering: Lettering = {
    id,
    words: said,
    face: "sample-face",
    fontSha256: "0".repeat(64),
    capHeight,
    letterSpacing: 2,
    kerning: true,
    lineSpacing: capHeight * 1.4,
    align: "centre",
    along: isLikely(chance) ? { kind: "line" } : { kind: "arc", radius: 200, side: "over" },
  };
  const box = { x: -capHeight / 3, y: -capHeight / 2, width: (2 * capHeight) / 3, height: capHeight };
  const letters = [...said].flatMap((reads, letter) =>
    reads.trim() === ""
      ? []
      : [{ letter, reads, path: rectanglePath(box), laid: { x: letter * capHeight, y: 0, turn: letter } }],
  );
  return {
    lettering,
    letters,
    box: { x: box.x, y: box.y, width: box.width + said.length * capHeight, height: capHeight },
  };
}

export const oil: Coat = { kind: "clear coat", name: "Oil", base: "oil or shellac", dryingHours: 12 };

export function idsOfOneLayer({ layers }: MockupDocument, chance: Chance): string[] {
  const ids = layers.map(({ pieces }) => pieces.map(({ id }) => id)).filter(({ length }) => length > 1);
  return ids.length === 0 ? [] : oneOf(chance, ids).slice(0, 3);
}
