import { regionAreaMm2, signedRingArea } from "../geometry/area.ts";
import { boxesOverlap } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { lengthsEqual } from "../geometry/tolerance.ts";
import { passesPanel } from "../hardware/standoff-parts.ts";
import { sheetMassG, woodDensityKgM3 } from "../materials/density.ts";
import type { MockupDocument, Wood } from "../mockup/document.ts";
import { backerThicknessMm, faceRegion, faceStock, frameOf } from "./backer.ts";
import { boardRegion, discsRegion } from "./piece-region.ts";
import { backerTopOf, type StandingPiece } from "./stand-pieces.ts";
import { type Spread, spreadOf } from "./touching.ts";

/** What pockets take out of a thing whose face lies at `face`: an area to a depth. */
type PocketCut = Spread & { readonly level: number; readonly face: number; readonly depth: number };

/** Pockets of a layer, joined where their clearances meet, so that nothing is taken out twice. */
function pocketCuts(standing: readonly StandingPiece[], kernel: Kernel): PocketCut[] {
  const groups = new Map<string, { pieces: StandingPiece[]; depth: number; clearance: number }>();
  for (const one of standing) {
    const { hold } = one.layer;
    if (hold.kind !== "pocket") continue;
    const key = `${one.level} ${one.base.nominal}`;
    const group = groups.get(key) ?? { pieces: [], depth: hold.depth, clearance: hold.clearance };
    group.pieces.push(one);
    groups.set(key, group);
  }
  return [...groups.values()].map(({ pieces, depth, clearance }) => {
    const joined = kernel.union(
      pieces.flatMap((one) => kernel.offset(one.region, clearance, "round")),
      "nonzero",
    );
    const [first] = pieces;
    return { ...spreadOf(joined), level: first?.level ?? 0, face: first?.base.nominal ?? 0, depth };
  });
}

/** mm³ that the pockets of layers above take out of a thing. */
function pocketVolume(
  thing: Spread & { level: number; face: number; thickness: number },
  cuts: readonly PocketCut[],
  kernel: Kernel,
): number {
  return cuts.reduce((volume, cut) => {
    const reaches = cut.level > thing.level && lengthsEqual(cut.face, thing.face);
    if (!reaches || !cut.box || !thing.box || !boxesOverlap(cut.box, thing.box)) return volume;
    return volume + regionAreaMm2(kernel.intersect(cut.region, thing.region)) * Math.min(cut.depth, thing.thickness);
  }, 0);
}

/**
 * Masses in grams: each piece less its hardware holes and the pockets let into it, by piece id, and the backer less its
 * pockets. Hardware, adhesive and finish are not in them, since nobody states their density.
 */
export function computeMasses(
  document: MockupDocument,
  standing: readonly StandingPiece[],
  kernel: Kernel,
): { readonly pieces: ReadonlyMap<string, number>; readonly backer: number } {
  const cuts = pocketCuts(standing, kernel);
  const pieces = new Map<string, number>();
  for (const one of standing) {
    const { thickness, stock } = one.layer;
    const drilled: Region =
      one.holes.length > 0 && one.layer.hold.kind === "standoff" && passesPanel(one.layer.hold.hardware)
        ? kernel.difference(one.region, discsRegion(one.holes, kernel))
        : one.region;
    const pockets = pocketVolume(
      { region: drilled, box: one.box, level: one.level, face: one.top.nominal, thickness },
      cuts,
      kernel,
    );
    const volume = Math.max(0, regionAreaMm2(drilled) * thickness - pockets);
    pieces.set(one.piece.id, sheetMassG(volume, 1, stock.densityKgM3));
  }
  const { backer } = document;
  const region = faceRegion(document, kernel);
  const thickness = backerThicknessMm(backer);
  const face = { ...spreadOf(region), level: -1, face: backerTopOf(document).nominal, thickness };
  const pockets = pocketVolume(face, cuts, kernel);
  return { pieces, backer: Math.max(0, woodMasses(document, kernel) - massOf(faceStock(backer), pockets)) };
}

const massOf = ({ gravity, moisturePercent }: Wood, volumeMm3: number): number =>
  sheetMassG(volumeMm3, 1, woodDensityKgM3(gravity, moisturePercent));

/** Plank or substrate, slats and frame, grams, without what pockets take. Slats that can't be laid count as a full face. */
function woodMasses(document: MockupDocument, kernel: Kernel): number {
  const { board, backer, frame } = document;
  const boardMm2 = regionAreaMm2(boardRegion(board, kernel));
  const plank = massOf(backer.stock, boardMm2 * backer.thickness);
  const { slats } = backer;
  const faceMm2 = regionAreaMm2(faceRegion(document, kernel));
  const laid = slats ? massOf(slats.stock, faceMm2 * (backerThicknessMm(backer) - backer.thickness)) : 0;
  const round = frameOf(document, kernel);
  const frameMm2 = round?.ok
    ? round.value.members.reduce((sum, { outline }) => sum + Math.abs(signedRingArea(outline)), 0)
    : 0;
  return plank + laid + (frame ? massOf(frame.stock, frameMm2 * frame.depth) : 0);
}
