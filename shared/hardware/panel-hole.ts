import type { Hardware } from "../mockup/document.ts";
import type { PanelHole } from "./hole-window-of-kind.ts";

/** What of a standoff bears on the hole in its panel. */
export function panelHoleOf(hardware: Hardware): PanelHole {
  switch (hardware.kind) {
    case "capStud": {
      const { studDiameter, capDiameter, barrelDiameter } = hardware;
      return { kind: "capStud", stud: studDiameter, cap: capDiameter, barrel: barrelDiameter };
    }
    case "throughScrew": {
      const { screw, cap, barrelDiameter } = hardware;
      const seen = cap?.diameter ?? null;
      return {
        kind: "throughScrew",
        screw: screw.diameter,
        head: screw.headDiameter,
        cap: seen,
        spacer: barrelDiameter,
      };
    }
    case "blindStud":
    case "edgeGrip":
      return { kind: hardware.kind };
  }
}
