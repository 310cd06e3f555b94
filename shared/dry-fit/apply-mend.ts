import { artworkOf } from "../mockup/artwork-used.ts";
import type { Hold, Hole, Layer, MockupDocument } from "../mockup/document.ts";
import { splitLayer } from "../mockup/split-layer.ts";
import { withoutUnusedLettering } from "../mockup/without-unused-lettering.ts";
import { nameOfPart } from "../pieces/name-of-part.ts";
import type { Mend, MendStep } from "./mend.ts";

/**
 * The document after a mend; the same object when none of its steps finds what it is about, as after that was deleted or locked.
 */
export function applyMend(document: MockupDocument, mend: Mend): MockupDocument {
  const mended = mend.steps.reduce(applyStep, document);
  return mended === document ? document : withoutUnusedLettering(mended);
}

function applyStep(document: MockupDocument, step: MendStep): MockupDocument {
  switch (step.kind) {
    case "hole diameter":
      return changeHole(document, step, (hole) => ({ ...hole, diameter: step.diameter }));
    case "hole place":
      return changeHole(document, step, (hole) => ({ ...hole, x: step.x, y: step.y }));
    case "fixed hole":
      return changeStandoff(document, step.layerKey, (hold) => ({
        ...hold,
        holes: hold.holes.map((hole) => ({ ...hole, fixed: hole.id === step.holeId })),
      }));
    case "offset":
      return changeStandoff(document, step.layerKey, (hold) => ({ ...hold, offset: step.offset }));
    case "hardware":
      return changeStandoff(document, step.layerKey, (hold) => ({
        ...hold,
        hardware: step.hardware,
        offset: step.offset,
      }));
    case "screw":
      return changeStandoff(document, step.layerKey, (hold) =>
        hold.hardware.kind === "blindStud" ? hold : { ...hold, hardware: { ...hold.hardware, screw: step.screw } },
      );
    case "adhesive":
      return changeLayer(document, step.layerKey, (layer) =>
        layer.hold.kind === "standoff" ? layer : { ...layer, hold: { ...layer.hold, adhesive: step.adhesive } },
      );
    case "tack":
      return changeLayer(document, step.layerKey, (layer) =>
        layer.hold.kind === "bond" ? { ...layer, hold: { ...layer.hold, tack: step.tack } } : layer,
      );
    case "locate":
      return changeLayer(document, step.layerKey, (layer) => ({ ...layer, locate: step.locate }));
    case "marked":
      return changeLayer(document, step.layerKey, (layer) => ({ ...layer, marked: step.marked }));
    case "stock":
      return changeLayer(document, step.layerKey, (layer) => ({ ...layer, stock: step.stock }));
    case "thickness":
      return changeLayer(document, step.layerKey, (layer) => ({ ...layer, thickness: step.thickness }));
    case "pocket":
      return changeLayer(document, step.layerKey, (layer) =>
        layer.hold.kind === "pocket"
          ? { ...layer, hold: { ...layer.hold, depth: step.depth, clearance: step.clearance } }
          : layer,
      );
    case "move pieces":
      return changePieces(document, step.pieceIds, (piece) => ({
        ...piece,
        placement: { ...piece.placement, x: piece.placement.x + step.dx, y: piece.placement.y + step.dy },
      }));
    case "drop pieces":
      return changePieces(document, step.pieceIds, () => []);
    case "reads":
      return changePieces(document, [step.pieceId], (piece) => ({ ...piece, reads: step.reads }));
    case "split piece":
      return splitPiece(document, step.pieceId, step.parts);
    case "slat start": {
      const { backer } = document;
      return backer.slats
        ? { ...document, backer: { ...backer, slats: { ...backer.slats, start: step.start } } }
        : document;
    }
    case "frame depth":
      return document.frame ? { ...document, frame: { ...document.frame, depth: step.depth } } : document;
    case "split layer":
      return splitLayer(document, step);
  }
}

type Piece = Layer["pieces"][number];
type StandoffHold = Extract<Hold, { kind: "standoff" }>;

function changeLayer(document: MockupDocument, key: string, change: (layer: Layer) => Layer): MockupDocument {
  const changed = document.layers.map((layer) => (layer.key === key && !layer.locked ? change(layer) : layer));
  return changed.every((layer, index) => layer === document.layers[index])
    ? document
    : { ...document, layers: changed };
}

function changeStandoff(
  document: MockupDocument,
  key: string,
  change: (hold: StandoffHold) => StandoffHold,
): MockupDocument {
  return changeLayer(document, key, (layer) => {
    if (layer.hold.kind !== "standoff") return layer;
    const hold = change(layer.hold);
    return hold === layer.hold ? layer : { ...layer, hold };
  });
}

function changeHole(
  document: MockupDocument,
  { layerKey, holeId }: { readonly layerKey: string; readonly holeId: string },
  change: (hole: Hole) => Hole,
): MockupDocument {
  return changeStandoff(document, layerKey, (hold) =>
    hold.holes.some(({ id }) => id === holeId)
      ? { ...hold, holes: hold.holes.map((hole) => (hole.id === holeId ? change(hole) : hole)) }
      : hold,
  );
}

function changePieces(
  document: MockupDocument,
  ids: readonly string[],
  change: (piece: Piece) => Piece | readonly Piece[],
): MockupDocument {
  const chosen = new Set(ids);
  return document.layers
    .filter(({ pieces }) => pieces.some(({ id }) => chosen.has(id)))
    .reduce(
      (now, { key }) =>
        changeLayer(now, key, (layer) => ({
          ...layer,
          pieces: layer.pieces.flatMap((piece) => (chosen.has(piece.id) ? change(piece) : piece)),
        })),
      document,
    );
}

/** What a piece reads is read once: its first part keeps it. */
function splitPiece(
  document: MockupDocument,
  pieceId: string,
  parts: Extract<MendStep, { kind: "split piece" }>["parts"],
): MockupDocument {
  return changePieces(document, [pieceId], (piece) =>
    parts.map((part, index) => ({
      ...piece,
      ...part,
      name: nameOfPart(piece.name, index + 1, parts.length),
      source: { kind: "worked", how: "split", artworkIds: [...artworkOf(piece.source)] },
      reads: index === 0 ? piece.reads : "",
    })),
  );
}
