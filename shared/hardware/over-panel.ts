import type { Hardware } from "../mockup/document.ts";
import { frontOf } from "./standoff-parts.ts";

/** What of a standoff lies over the panel's face. All mm. */
export type OverPanel = {
  readonly what: "cap" | "head" | "grip";
  readonly diameter: number;
  /** How far it stands over the panel's face. */
  readonly heightMm: number;
};

/**
 * What of a standoff needs room on the face of its panel, `faceMm` above the wood it stands on: cap, head or the upper
 * side of a slot; null where nothing of it comes there.
 */
export function overPanel(hardware: Hardware, faceMm: number): OverPanel | null {
  if (hardware.kind === "edgeGrip") {
    const heightMm = Math.max(0, hardware.height - faceMm);
    return { what: "grip", diameter: hardware.barrelDiameter, heightMm };
  }
  const front = frontOf(hardware);
  if (!front) return null;
  const what = hardware.kind === "throughScrew" && !hardware.cap ? "head" : "cap";
  return { what, diameter: front.diameter, heightMm: front.thickness };
}
