import type { MockupDocument, Piece } from "#shared/mockup/document.ts";
import { anchors } from "@/features/mockup/model/anchors.ts";
import { addCopies } from "@/features/mockup/model/commands/add-copies.ts";
import { addLayer, doubleLayer } from "@/features/mockup/model/commands/add-layer.ts";
import { addLettering } from "@/features/mockup/model/commands/add-lettering.ts";
import { addMargin } from "@/features/mockup/model/commands/add-margin.ts";
import { addPlate, addPlateToLayer } from "@/features/mockup/model/commands/add-plate.ts";
import { bringInArtwork } from "@/features/mockup/model/commands/bring-in-artwork.ts";
import {
  addHole,
  fitHoles,
  fixHole,
  proposeHoles,
  removeHole,
  setHole,
} from "@/features/mockup/model/commands/holes.ts";
import { lineUp } from "@/features/mockup/model/commands/line-up.ts";
import { moveLayer, removeLayer } from "@/features/mockup/model/commands/order-layers.ts";
import { paste } from "@/features/mockup/model/commands/paste.ts";
import { shiftMotion } from "@/features/mockup/model/commands/piece-motion.ts";
import {
  centrePieces,
  mirrorPieces,
  moveAllPieces,
  movePieces,
  placePiece,
  removePieces,
  scalePieces,
  turnPieces,
} from "@/features/mockup/model/commands/pieces.ts";
import { placeChosen } from "@/features/mockup/model/commands/place-chosen.ts";
import { replaceArtwork } from "@/features/mockup/model/commands/replace-artwork.ts";
import { replacePieces } from "@/features/mockup/model/commands/replace-pieces.ts";
import { setBoard } from "@/features/mockup/model/commands/set-board.ts";
import {
  bondLayer,
  letInLayer,
  raiseLayer,
  setPocket,
  setTack,
  standLayer,
} from "@/features/mockup/model/commands/set-hold.ts";
import { setLayer } from "@/features/mockup/model/commands/set-layer.ts";
import { setLetteringAgain } from "@/features/mockup/model/commands/set-lettering-again.ts";
import { setReads } from "@/features/mockup/model/commands/set-reads.ts";
import {
  chooseWallPhoto,
  hangAt,
  markCorner,
  setSheet,
  setWallColour,
} from "@/features/mockup/model/commands/set-wall.ts";
import { cutAwayPieces, dropLooseBits, joinPieces, splitPiece } from "@/features/mockup/model/commands/shape-pieces.ts";
import { hideLayer, lockLayer } from "@/features/mockup/model/commands/show-layer.ts";
import { stepOff, stepOffCopies } from "@/features/mockup/model/commands/step-off.ts";
import { copyOf } from "@/features/mockup/model/copied.ts";
import { matchArtworks } from "@/features/mockup/model/match-artworks.ts";
import { pine } from "../unit/src/features/mockup/sample-mockup.ts";
import { inside } from "../unit/src/features/mockup/sites.ts";
import {
  artworks,
  type Chance,
  glue,
  holeOf,
  idsOfOneLayer,
  isLikely,
  key,
  newLayer,
  number,
  oil,
  oneOf,
  pieceOf,
  piecesOf,
  shape,
  shaped,
  sheet,
  size,
  stud,
  text,
  together,
  words,
} from "./random-chance.ts";

export type RandomCommand = (document: MockupDocument, chance: Chance) => MockupDocument;

/** Every command of src/features/mockup/model/commands by its name, driven by chance. A test fails when one is missing. */
export const randomCommands: Readonly<Record<string, RandomCommand>> = {
  addCopies: (document, chance) =>
    addCopies(document, {
      pieceIds: piecesOf(document, chance),
      motions: [shiftMotion(number(chance), 7), shiftMotion(20, number(chance))],
      id: chance.newId(),
      withHoles: isLikely(chance),
      site: inside,
    }),
  addLayer: (document, chance) =>
    addLayer(document, {
      ...newLayer(chance),
      place: oneOf(chance, ["wall", "viewer", { under: key(document, chance) }] as const),
    }),
  doubleLayer: (document, chance) => doubleLayer(document, { key: key(document, chance), id: chance.newId() }),
  addLettering: (document, chance) =>
    addLettering(document, {
      set: words(chance, isLikely(chance, 0.95) ? chance.newId() : (document.lettering[0]?.id ?? chance.newId())),
      id: chance.newId(),
      into: isLikely(chance)
        ? { kind: "new", layer: newLayer(chance), site: inside }
        : { kind: "existing", key: key(document, chance) },
    }),
  addMargin: (document, chance) =>
    addMargin(document, {
      ...newLayer(chance),
      plates: Array.from({ length: Math.floor(chance.next() * 3) }, () => shaped(chance)),
      pieceIds: piecesOf(document, chance),
      choice: { marginMm: size(chance), corners: oneOf(chance, ["round", "sharp"] as const) },
      place: oneOf(chance, ["wall", "viewer"] as const),
    }),
  addPlate: (document, chance) =>
    addPlate(document, {
      ...newLayer(chance),
      shape: shape(chance),
      nearest: oneOf(chance, ["wall", "viewer"] as const),
    }),
  addPlateToLayer: (document, chance) =>
    addPlateToLayer(document, {
      key: key(document, chance),
      shape: shape(chance),
      id: chance.newId(),
      name: text(chance),
    }),
  bringInArtwork: (document, chance) =>
    bringInArtwork(document, {
      artwork: oneOf(chance, artworks),
      choices: ["#111111", "#EEEEEE", "#777777"].map((colour) => ({
        ...newLayer(chance),
        colour,
        solid: isLikely(chance),
      })),
      id: chance.newId(),
      site: inside,
    }),
  replaceArtwork: (document, chance) => {
    const [before, after] = [oneOf(chance, artworks), oneOf(chance, artworks)];
    return replaceArtwork(document, {
      before,
      after,
      match: matchArtworks(before, after, oneOf(chance, ["as before", "its own"] as const)),
      come: new Map([[2, key(document, chance)]]),
      id: chance.newId(),
    });
  },
  replacePieces: (document, chance) => {
    const [first] = piecesOf(document, chance);
    const by: Piece[] = [];
    return replacePieces(document, [{ ids: first === undefined ? [] : [first], by }]);
  },
  addHole: (document, chance) =>
    addHole(document, {
      key: key(document, chance),
      id: chance.newId(),
      x: number(chance),
      y: number(chance),
      site: inside,
    }),
  fitHoles: (document, chance) => fitHoles(document, { key: key(document, chance), site: inside }),
  setHole: (document, chance) =>
    setHole(document, { holeId: holeOf(document, chance), x: number(chance), diameter: size(chance) / 10 }),
  removeHole: (document, chance) => removeHole(document, { holeId: holeOf(document, chance) }),
  fixHole: (document, chance) => fixHole(document, { holeId: holeOf(document, chance) }),
  proposeHoles: (document, chance) =>
    proposeHoles(document, { key: key(document, chance), id: chance.newId(), site: inside }),
  lineUp: (document, chance) =>
    lineUp(document, {
      pieceIds: piecesOf(document, chance),
      together: together(chance),
      by: oneOf(chance, ["left", "centre", "right", "top", "middle", "bottom"] as const),
      to: oneOf(chance, ["the board", "each other", "the first chosen"] as const),
    }),
  moveLayer: (document, chance) =>
    moveLayer(document, { key: key(document, chance), towards: oneOf(chance, ["viewer", "wall"] as const) }),
  removeLayer: (document, chance) => removeLayer(document, { key: key(document, chance) }),
  paste: (document, chance) => {
    const copied = copyOf(document, piecesOf(document, chance));
    if (copied === null) return document;
    const into = isLikely(chance) ? null : key(document, chance);
    return paste(document, { copied, into, id: chance.newId(), site: inside });
  },
  movePieces: (document, chance) =>
    movePieces(document, { pieceIds: piecesOf(document, chance), dx: number(chance), dy: number(chance) }),
  moveAllPieces: (document, chance) => moveAllPieces(document, { dx: number(chance) / 50, dy: number(chance) / 50 }),
  placePiece: (document, chance) =>
    placePiece(document, {
      pieceId: pieceOf(document, chance),
      x: number(chance),
      y: number(chance),
      turn: number(chance),
      scale: size(chance) / 150,
    }),
  turnPieces: (document, chance) => turnPieces(document, { pieceIds: piecesOf(document, chance), by: number(chance) }),
  scalePieces: (document, chance) =>
    scalePieces(document, { pieceIds: piecesOf(document, chance), by: size(chance) / 150 }),
  mirrorPieces: (document, chance) =>
    mirrorPieces(document, {
      pieceIds: piecesOf(document, chance),
      way: oneOf(chance, ["across", "down"] as const),
    }),
  centrePieces: (document, chance) =>
    centrePieces(document, {
      pieceIds: piecesOf(document, chance),
      way: oneOf(chance, ["across", "down", "both"] as const),
    }),
  removePieces: (document, chance) => removePieces(document, { pieceIds: piecesOf(document, chance) }),
  placeChosen: (document, chance) =>
    placeChosen(document, {
      pieceIds: piecesOf(document, chance),
      anchor: oneOf(chance, anchors),
      ...oneOf(chance, [
        { x: number(chance) },
        { y: number(chance) },
        { width: size(chance) },
        { height: size(chance) },
      ]),
    }),
  setBoard: (document, chance) =>
    setBoard(
      document,
      oneOf(chance, [
        { width: number(chance), height: number(chance) },
        { thickness: number(chance), stock: pine, grainTurn: number(chance) },
        { quantity: number(chance), viewingDistance: number(chance) },
        { finish: Array.from({ length: Math.floor(chance.next() * 15) }, () => oil) },
      ]),
    ),
  bondLayer: (document, chance) => bondLayer(document, { key: key(document, chance), adhesive: glue(chance) }),
  letInLayer: (document, chance) => letInLayer(document, { key: key(document, chance), adhesive: glue(chance) }),
  setPocket: (document, chance) =>
    setPocket(document, {
      key: key(document, chance),
      depth: number(chance) / 100,
      clearance: number(chance) / 200,
      cut: oneOf(chance, ["routed", "engraved"] as const),
      bitRadius: number(chance) / 30,
    }),
  setTack: (document, chance) =>
    setTack(document, { key: key(document, chance), tack: isLikely(chance) ? glue(chance) : null }),
  standLayer: (document, chance) =>
    standLayer(document, { key: key(document, chance), hardware: stud(chance), id: chance.newId(), site: inside }),
  raiseLayer: (document, chance) =>
    raiseLayer(document, {
      key: key(document, chance),
      offset: number(chance) / 10,
      hardware: isLikely(chance) ? stud(chance) : undefined,
    }),
  setLayer: (document, chance) =>
    setLayer(document, {
      key: key(document, chance),
      name: text(chance),
      stock: sheet(chance),
      thickness: number(chance) / 40,
      locate: oneOf(chance, ["template", "none", "scored line"] as const),
      marked: oneOf(chance, ["front", "back"] as const),
    }),
  setLetteringAgain: (document, chance) => {
    const set = words(chance, oneOf(chance, [...document.lettering.map(({ id }) => id), "no words"]));
    return setLetteringAgain(document, { ...set, id: chance.newId(), putBack: isLikely(chance) });
  },
  setReads: (document, chance) =>
    setReads(document, new Map(piecesOf(document, chance).map((id) => [id, text(chance)]))),
  joinPieces: (document, chance) =>
    joinPieces(document, {
      joined: [{ ids: idsOfOneLayer(document, chance), shaped: shaped(chance) }],
      id: chance.newId(),
    }),
  cutAwayPieces: (document, chance) =>
    cutAwayPieces(document, {
      cut: piecesOf(document, chance).map((id) => ({
        id,
        left: Array.from({ length: Math.floor(chance.next() * 3) }, () => shaped(chance)),
        takenMm2: 10,
      })),
      by: piecesOf(document, chance),
      useUp: isLikely(chance),
      id: chance.newId(),
    }),
  dropLooseBits: (document, chance) =>
    dropLooseBits(document, {
      found: piecesOf(document, chance).map((id) => ({
        id,
        left: isLikely(chance, 0.8) ? shaped(chance) : null,
        bits: [],
      })),
    }),
  splitPiece: (document, chance) =>
    splitPiece(document, {
      pieceId: pieceOf(document, chance),
      parts: Array.from({ length: 1 + Math.floor(chance.next() * 3) }, () => shaped(chance)),
      id: chance.newId(),
    }),
  setWallColour: (document, chance) => setWallColour(document, oneOf(chance, ["#A1B2C3", "#FFFFFF", "red", ""])),
  chooseWallPhoto: (document, chance) =>
    chooseWallPhoto(
      document,
      isLikely(chance, 0.2)
        ? null
        : { photoId: oneOf(chance, artworks).artworkId, widthPx: 1600, heightPx: 1200, paper: "A4" },
    ),
  setSheet: (document, chance) =>
    setSheet(document, {
      paper: oneOf(chance, ["A4", "Letter"] as const),
      lies: oneOf(chance, ["upright", "lying"] as const),
    }),
  markCorner: (document, chance) =>
    markCorner(document, {
      corner: Math.floor(chance.next() * 6) - 1,
      to: { x: number(chance), y: number(chance) },
    }),
  hangAt: (document, chance) => hangAt(document, isLikely(chance) ? { x: number(chance) } : { y: number(chance) }),
  hideLayer: (document, chance) => hideLayer(document, { key: key(document, chance), hidden: isLikely(chance) }),
  // Unlocked more often than locked: what is locked takes no other command.
  lockLayer: (document, chance) => lockLayer(document, { key: key(document, chance), locked: isLikely(chance, 0.2) }),
  stepOff: (document, chance) =>
    stepOff(document, {
      pieceIds: piecesOf(document, chance),
      together: together(chance),
      way: oneOf(chance, [
        {
          kind: "along",
          angle: number(chance),
          spacing: oneOf(chance, [{ kind: "pitch", mm: number(chance) }, { kind: "equal gaps" }] as const),
          onto: isLikely(chance),
        },
        { kind: "round", centre: { x: 300, y: 200 }, radius: size(chance), sweep: 360, turned: isLikely(chance) },
      ] as const),
    }),
  stepOffCopies: (document, chance) =>
    stepOffCopies(document, {
      pieceIds: piecesOf(document, chance).slice(0, 1),
      count: 1 + Math.floor(chance.next() * 3),
      way: {
        kind: "along",
        angle: number(chance),
        spacing: { kind: oneOf(chance, ["pitch", "gap", "over"] as const), mm: size(chance) },
      },
      id: chance.newId(),
      withHoles: isLikely(chance),
      site: inside,
    }),
};

/** How large a document may grow before chance only takes away: what is looked for is in the steps, not in the size. */
const enough = { layers: 14, pieces: 90 };

/** One random command on a document, by its name. */
export function randomStep(document: MockupDocument, chance: Chance): { name: string; next: MockupDocument } {
  const pieces = document.layers.reduce((sum, layer) => sum + layer.pieces.length, 0);
  const isLarge = document.layers.length > enough.layers || pieces > enough.pieces;
  const name = oneOf(chance, isLarge ? ["removeLayer", "lockLayer"] : Object.keys(randomCommands));
  const command = randomCommands[name];
  if (!command) throw new Error(`There is no command ${name}.`);
  return { name, next: command(document, chance) };
}
