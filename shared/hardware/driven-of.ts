import type { Hardware } from "../mockup/document.ts";
import type { Banded } from "../units/banded.ts";
import type { Driven, HeadSeat } from "./screw-reach.ts";

/**
 * What of a standoff goes into the wood. `stack` is what lies between its front and its barrel, `offset` how far the
 * panel's back is held off, both in mm.
 */
export function drivenOf(hardware: Hardware, { stack, offset }: { stack: Banded; offset: number }): Driven {
  switch (hardware.kind) {
    case "capStud":
    case "edgeGrip": {
      const { kind, floorThickness, screw } = hardware;
      return {
        kind,
        length: screw.length,
        floor: floorThickness,
        seat: seatOf(hardware),
        headHeight: screw.headHeight,
      };
    }
    case "throughScrew": {
      const { screw, washerThickness, barrelLength } = hardware;
      return {
        kind: "throughScrew",
        length: screw.length,
        washer: washerThickness,
        panel: stack,
        spacer: barrelLength,
      };
    }
    case "blindStud":
      return { kind: "blindStud", length: hardware.studLength, offset };
  }
}

function seatOf({ countersunk, screw }: Extract<Hardware, { kind: "capStud" | "edgeGrip" }>): HeadSeat {
  if (screw.head !== "flat") return "pan or round";
  return countersunk ? "flat in a countersunk floor" : "flat on a plain floor";
}
