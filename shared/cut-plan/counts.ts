import { tackThenBond, waitingHours } from "../bonds/adhesive-families.ts";
import { nearestDrillMm, pilotHoleMm } from "../hardware/pilot-hole.ts";
import { passesPanel } from "../hardware/standoff-parts.ts";
import { rootDiameterMm } from "../materials/wood-screw-threads.ts";
import type { Hardware, Layer, MockupDocument, Screw } from "../mockup/document.ts";
import type { LengthUnit } from "../units/length.ts";

export type LayerCount = {
  readonly key: string;
  readonly name: string;
  readonly stock: string;
  readonly thicknessMm: number;
  /** Of one sign, and of all of them. */
  readonly each: number;
  readonly all: number;
};

/** A hole that hardware asks for, and how many of all signs. */
export type DrilledHole = {
  readonly into: "panel" | "wood";
  readonly diameterMm: number;
  /** From the wood's face for what is let into it; null for a hole through the panel, or as deep as the screw goes. */
  readonly depthMm: number | null;
  readonly count: number;
};

export type HardwareCount = {
  readonly hardware: Hardware;
  readonly layers: readonly string[];
  readonly count: number;
  readonly holes: readonly DrilledHole[];
};

export type ScrewCount = {
  readonly screw: Screw;
  readonly count: number;
  /** Drilled ahead of it in the wood that it bites in; null for a screw without a number, whose root nobody knows. */
  readonly pilotMm: number | null;
};

/** A joint that is glued: of a layer to what is under it. Hours until it can be moved, and until it may be loaded. */
export type JointCount = {
  readonly layerKey: string;
  readonly layerName: string;
  readonly adhesives: readonly string[];
  readonly pieces: number;
  readonly handlingHours: number;
  readonly fullHours: number;
};

/** The plank, or what slats are glued on: what goes round the board, of all signs. */
export type BoardCount = {
  readonly stock: string;
  readonly thicknessMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly count: number;
};

export type Counts = {
  readonly board: BoardCount;
  readonly layers: readonly LayerCount[];
  readonly hardware: readonly HardwareCount[];
  readonly screws: readonly ScrewCount[];
  readonly joints: readonly JointCount[];
};

/** A stud's hole in the wood is that much deeper than the stud (common practice). */
const studRoomMm = 1;

/** Everything that is laid ready before a build, for all signs of a document. Drills to the nearest that `unit` has. */
export function countParts(document: MockupDocument, unit: LengthUnit): Counts {
  const { layers, quantity, board, backer } = document;
  const hardware = countHardware(document);
  return {
    board: {
      stock: backer.stock.name,
      thicknessMm: backer.thickness,
      widthMm: board.width,
      heightMm: board.height,
      count: quantity,
    },
    layers: layers
      .filter(({ pieces }) => pieces.length > 0)
      .map(({ key, name, stock, thickness, pieces }) => ({
        key,
        name,
        stock: stock.name,
        thicknessMm: thickness,
        each: pieces.length,
        all: pieces.length * quantity,
      })),
    hardware,
    screws: countScrews(hardware, backer.stock.hardness, unit),
    joints: layers.flatMap((layer) => jointOf(layer, quantity)),
  };
}

function countHardware({ layers, quantity }: MockupDocument): HardwareCount[] {
  const kinds = new Map<string, { hardware: Hardware; layers: string[]; count: number; holes: DrilledHole[] }>();
  for (const { key, hold } of layers) {
    if (hold.kind !== "standoff" || hold.holes.length === 0) continue;
    const { hardware, holes, offset } = hold;
    const name = JSON.stringify(hardware);
    const kind = kinds.get(name) ?? { hardware, layers: [], count: 0, holes: [] };
    kinds.set(name, kind);
    kind.layers.push(key);
    kind.count += holes.length * quantity;
    if (passesPanel(hardware))
      for (const { diameter } of holes)
        addHole(kind.holes, { into: "panel", diameterMm: diameter, depthMm: null, count: quantity });
    if (hardware.kind === "blindStud") {
      const depthMm = hardware.studLength - offset + studRoomMm;
      addHole(kind.holes, { into: "wood", diameterMm: hardware.studDiameter, depthMm, count: holes.length * quantity });
    }
  }
  return [...kinds.values()];
}

function addHole(holes: DrilledHole[], hole: DrilledHole): void {
  const same = holes.findIndex(
    ({ into, diameterMm, depthMm }) => into === hole.into && diameterMm === hole.diameterMm && depthMm === hole.depthMm,
  );
  const before = holes[same];
  if (before) holes[same] = { ...before, count: before.count + hole.count };
  else holes.push(hole);
}

function countScrews(
  hardware: readonly HardwareCount[],
  hardness: "softwood" | "hardwood",
  unit: LengthUnit,
): ScrewCount[] {
  const screws = new Map<string, ScrewCount>();
  for (const { hardware: one, count } of hardware) {
    if (one.kind === "blindStud") continue;
    const { screw } = one;
    const name = JSON.stringify(screw);
    const before = screws.get(name)?.count ?? 0;
    screws.set(name, { screw, count: before + count, pilotMm: pilotDrillMm(screw, hardness, unit) });
  }
  return [...screws.values()];
}

function pilotDrillMm({ gauge }: Screw, hardness: "softwood" | "hardwood", unit: LengthUnit): number | null {
  const root = gauge === null ? null : rootDiameterMm(gauge);
  if (root === null) return null;
  const hole = pilotHoleMm(root, hardness);
  const drill = hole.ok ? nearestDrillMm(hole.value, unit) : hole;
  return drill.ok ? drill.value : null;
}

function jointOf({ key, name, hold, pieces }: Layer, quantity: number): JointCount[] {
  if (hold.kind === "standoff" || pieces.length === 0) return [];
  const tack = hold.kind === "bond" ? hold.tack : null;
  const { family } = hold.adhesive;
  const hours = waitingHours(tack ? tackThenBond(tack.family, family) : family);
  return [
    {
      layerKey: key,
      layerName: name,
      adhesives: [...(tack ? [tack.name] : []), hold.adhesive.name],
      pieces: pieces.length * quantity,
      handlingHours: hours.handling,
      fullHours: hours.full,
    },
  ];
}
