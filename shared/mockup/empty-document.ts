import { documentVersion, type MockupDocument, type Wood } from "./document.ts";
import { leastBoardMm } from "./schema-parts.ts";

/**
 * A document with a plain board and nothing on it. Size in mm, as the brief states it or 600 by 400; light from the
 * upper left at 45°, seen from 3 m.
 */
export function emptyDocument(options: {
  readonly backer: Wood;
  readonly widthMm?: number;
  readonly heightMm?: number;
  readonly thicknessMm?: number;
  readonly quantity?: number;
  readonly viewingDistanceMm?: number;
  readonly wall?: string;
}): MockupDocument {
  return {
    version: documentVersion,
    board: {
      outline: { kind: "rectangle" },
      width: Math.max(leastBoardMm, options.widthMm ?? 600),
      height: Math.max(leastBoardMm, options.heightMm ?? 400),
      measures: "overall",
    },
    hanging: { kind: "none", gap: 0, pose: "upright", carriesKg: null, points: [] },
    quantity: options.quantity ?? 1,
    backer: { stock: options.backer, thickness: options.thicknessMm ?? 18, grainTurn: 0, slats: null, finish: [] },
    frame: null,
    layers: [],
    lettering: [],
    presentation: {
      wall: options.wall ?? "#EFE9DC",
      photo: null,
      light: { azimuth: 315, elevation: 45, angularSize: 0.05 },
      viewingDistance: options.viewingDistanceMm ?? 3000,
    },
  };
}
