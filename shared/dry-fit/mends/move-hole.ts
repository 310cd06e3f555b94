import type { Point } from "../../geometry/path.ts";
import { isShorter } from "../../geometry/tolerance.ts";
import { jointUnder } from "../../hardware/barrel-foot.ts";
import { edgeOverlapMm } from "../../hardware/edge-grip.ts";
import { nearestPlace } from "../../hardware/nearest-place.ts";
import { seenDiameterMm } from "../../hardware/standoff-parts.ts";
import type { Hole } from "../../mockup/document.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { footGround, footShare } from "../foot-share.ts";
import { gripFault } from "../grip-fault.ts";
import { holeEdgeFault } from "../hole-edge-fault.ts";
import type { Mend, MendStep } from "../mend.ts";
import { type FrontPlace, frontAt, thingsOver } from "../on-panel.ts";
import type { RuleInput } from "../rule.ts";
import { pieceAt, type StandoffLayer, standoffLayerOf } from "../standoff-layers.ts";
import { intoWindow, isEmptyWindow, windowOfHole } from "../window-of-hole.ts";

/**
 * Moves a finding's hole to the nearest place where it keeps off the edges, its front lies on one level and its foot
 * stands on what the barrels stand on and over no open joint, as wide as it has to be there. A place where its stud grips as
 * before goes before a nearer one where it no longer would. None when there is no such place near by.
 */
export function moveHoleMends({ layerKey, holeId }: Finding, input: RuleInput): Mend[] {
  const standing = standoffLayerOf(input, layerKey);
  const hole = standing?.hold.holes.find(({ id }) => id === holeId);
  if (!standing || !hole) return [];
  const fits = fitsAt(standing, hole, input);
  const place = nearestPlace(hole, (at) => fits(at, "grips")) ?? nearestPlace(hole, (at) => fits(at, "any"));
  if (!place) return [];
  const { key } = standing.layer;
  const { diameter } = movedTo(standing, hole, place, input);
  const steps: MendStep[] = [{ kind: "hole place", layerKey: key, holeId: hole.id, ...place }];
  if (diameter !== hole.diameter) steps.push({ kind: "hole diameter", layerKey: key, holeId: hole.id, diameter });
  const far = formatFine(Math.hypot(place.x - hole.x, place.y - hole.y), input.context.unit);
  return [{ label: `Move it by ${far}`, steps }];
}

/** The hole at another place, as wide as its window there asks for; as wide as it was where there is none. */
function movedTo({ hold }: StandoffLayer, hole: Hole, place: Point, input: RuleInput): Hole {
  const moved = { ...hole, x: place.x, y: place.y };
  const holes = hold.holes.map((one) => (one.id === hole.id ? moved : one));
  const window = windowOfHole({ hardware: hold.hardware, holes }, moved, input);
  return window && !isEmptyWindow(window) ? { ...moved, diameter: intoWindow(hole.diameter, window) } : moved;
}

type Fits = (place: Point, grip: "grips" | "any") => boolean;

function fitsAt(layer: StandoffLayer, hole: Hole, input: RuleInput): Fits {
  const { hold, level } = layer;
  const { limits } = input;
  const { hardware } = hold;
  const held = pieceAt(layer, hole);
  // A standoff goes on holding the piece that it holds; one that holds none may come to hold any.
  const standing = held ? { ...layer, pieces: [held] } : layer;
  const over = thingsOver(input, level);
  const grounds = new Map(standing.pieces.map((piece) => [piece.pieceId, footGround(standing, piece, input)]));
  const apart = Math.max(hardware.barrelDiameter, seenDiameterMm(hardware));
  const others = hold.holes.filter((other) => other.id !== hole.id);
  const front = (place: Point, piece: PieceFigures) =>
    frontAt(place, { hold, piece, things: over(piece), clearanceMm: limits.capClearanceMm });
  const isLoose = ({ stack }: FrontPlace) => gripFault(hardware, { stack, offset: hold.offset }, limits) !== null;
  const wasLoose = held !== null && isLoose(front(hole, held));
  return (place, grip) => {
    if (others.some((other) => isShorter(Math.hypot(other.x - place.x, other.y - place.y), apart))) return false;
    const moved = movedTo(standing, hole, place, input);
    const piece = pieceAt(standing, moved);
    const ground = piece && grounds.get(piece.pieceId);
    if (!piece || !ground) return false;
    if (holeEdgeFault(standing, moved, limits)) return false;
    if (hardware.kind === "edgeGrip") {
      const overlap = edgeOverlapMm(hardware.barrelDiameter, piece.region, place);
      if (isShorter(overlap, limits.edgeGripMm) || isShorter(hardware.gripDepth, overlap)) return false;
    }
    const at = front(place, piece);
    if (grip === "grips" && !wasLoose && isLoose(at)) return false;
    if (at.over.length > 0 || at.under.length > 0) return false;
    if (jointUnder({ x: place.x, y: place.y, diameter: hardware.barrelDiameter }, ground.openJoints)) return false;
    return !isShorter(footShare(place, hardware.barrelDiameter, ground, input), limits.footShare);
  };
}
