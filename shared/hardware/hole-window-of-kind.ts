import { type HoleWindow, holeWindow } from "./hole-window.ts";

/** What of a fixing bears on the hole in its panel. All mm. */
export type PanelHole =
  | { readonly kind: "capStud"; readonly stud: number; readonly cap: number; readonly barrel: number }
  | {
      readonly kind: "throughScrew";
      readonly screw: number;
      readonly head: number;
      /** A cap over the head; null when the head itself is seen. */
      readonly cap: number | null;
      readonly spacer: number;
    }
  /** Fixed to the panel's back: nothing passes it. */
  | { readonly kind: "blindStud" }
  /** Holds the panel by its edge: nothing passes it. */
  | { readonly kind: "edgeGrip" };

type Play = { readonly placingError: number; readonly movement: number; readonly cover: number };

/**
 * The hole window of any kind of hardware, in mm: what passes is the cap's stud or the screw, what hides the hole is the
 * cap or, without one, the screw's head. Null where the panel has no hole. Arithmetic, as for the cap standoff.
 */
export function holeWindowOfKind(hole: PanelHole, play: Play): HoleWindow | null {
  switch (hole.kind) {
    case "capStud":
      return holeWindow({ passing: hole.stud, cap: hole.cap, barrel: hole.barrel, ...play });
    case "throughScrew": {
      // A cap that is smaller than the head under it hides nothing that the head does not.
      const cover = Math.max(hole.head, hole.cap ?? 0);
      return holeWindow({ passing: hole.screw, cap: cover, barrel: hole.spacer, ...play });
    }
    case "blindStud":
    case "edgeGrip":
      return null;
  }
}
