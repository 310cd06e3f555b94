import type { Hardware } from "#shared/mockup/document.ts";
import { across, along, drawnScrew, type Parts, screwBodies, turned, woodDepth, woodUnder } from "./section-bodies.ts";
import type { WrittenHardware } from "./written.ts";

/** A panel to draw the standoff with, mm; its thickness is none of the standoff's. */
const panelThickness = 4.5;

/** A measure of the standoff in mm, as it is drawn. */
type Of = (field: string) => number;

/** What a standoff of each kind consists of, and where its measures are taken. */
export function partsOf(hardware: WrittenHardware, of: Of): Parts {
  switch (hardware.kind) {
    case "capStud":
      return capStudParts(hardware, of);
    case "throughScrew":
      return throughScrewParts(hardware, of);
    case "blindStud":
      return blindStudParts(hardware, of);
    case "edgeGrip":
      return edgeGripParts(hardware, of);
  }
}

type OfKind<K extends Hardware["kind"]> = Extract<WrittenHardware, { readonly kind: K }>;

function capStudParts({ screw, countersunk }: OfKind<"capStud">, of: Of): Parts {
  const barrel = of("barrelLength");
  const floor = of("floorThickness");
  const face = barrel + panelThickness;
  const cap = of("capThickness");
  const width = Math.max(of("barrelDiameter"), of("capDiameter")) * 1.35;
  return {
    bodies: [
      turned("wood", -woodUnder(screw, floor), 0, width),
      turned("panel", barrel, face, width),
      turned("hollow", barrel, face, of("studDiameter") + 2),
      turned("metal", 0, barrel, of("barrelDiameter")),
      turned("hollow", floor, floor + of("boreDepth"), of("boreDiameter")),
      turned("hollow", 0, floor, of("floorHole")),
      ...screwBodies(screw, { seat: floor, countersunk }),
      turned("metal", face - of("studLength"), face, of("studDiameter")),
      turned("metal", face, face + cap, of("capDiameter")),
    ],
    at: {
      barrelLength: along(0, barrel),
      floorThickness: along(0, floor),
      boreDepth: along(floor, floor + of("boreDepth")),
      studLength: along(face - of("studLength"), face),
      capThickness: along(face, face + cap),
      floorHole: across(floor / 2, of("floorHole")),
      barrelDiameter: across(floor + of("boreDepth") * 0.12, of("barrelDiameter")),
      boreDiameter: across(floor + of("boreDepth") * 0.4, of("boreDiameter")),
      studDiameter: across(barrel - 1, of("studDiameter")),
      capDiameter: across(face + cap, of("capDiameter")),
    },
  };
}

function throughScrewParts({ screw, cap }: OfKind<"throughScrew">, of: Of): Parts {
  const barrel = of("barrelLength");
  const back = barrel + of("washerThickness");
  const face = back + panelThickness;
  const width = Math.max(of("barrelDiameter"), cap ? of("cap.diameter") : 0) * 1.35;
  const { headHeight } = drawnScrew(screw);
  const top = face + (cap ? of("cap.thickness") : headHeight);
  return {
    bodies: [
      turned("wood", -woodDepth * 2, 0, width),
      turned("panel", back, face, width),
      turned("hollow", back, face, drawnScrew(screw).diameter + 2),
      turned("metal", 0, barrel, of("barrelDiameter")),
      ...(back > barrel ? [turned("screw", barrel, back, of("barrelDiameter"))] : []),
      turned("hollow", 0, barrel, of("boreDiameter")),
      ...(cap ? [turned("metal", face, top, of("cap.diameter"))] : []),
      ...screwBodies(screw, { seat: face + (cap ? headHeight : 0), countersunk: true, tip: -woodDepth * 1.5 }),
    ],
    at: {
      barrelLength: along(0, barrel),
      ...(back > barrel ? { washerThickness: along(barrel, back) } : {}),
      "cap.thickness": along(face, top),
      barrelDiameter: across(barrel * 0.3, of("barrelDiameter")),
      boreDiameter: across(barrel * 0.7, of("boreDiameter")),
      "cap.diameter": across(top, of("cap.diameter")),
    },
  };
}

function blindStudParts(hardware: OfKind<"blindStud">, of: Of): Parts {
  const spacer = hardware.barrelLength === 0 ? 0 : of("barrelLength");
  // Without a spacer the panel stands off by what glue and eye say; half the stud is drawn in the wood.
  const back = spacer === 0 ? of("studLength") / 2 : spacer;
  const tip = back - of("studLength");
  const width = Math.max(of("barrelDiameter"), of("studDiameter") * 2) * 1.6;
  return {
    bodies: [
      turned("wood", Math.min(-woodDepth, tip - 2), 0, width),
      turned("panel", back, back + panelThickness, width),
      ...(spacer > 0 ? [turned("metal", 0, spacer, of("barrelDiameter"))] : []),
      turned("screw", tip, back, of("studDiameter")),
    ],
    at: {
      studLength: along(tip, back),
      ...(spacer > 0
        ? { barrelLength: along(0, spacer), barrelDiameter: across(spacer * 0.7, of("barrelDiameter")) }
        : {}),
      studDiameter: across(tip / 2, of("studDiameter")),
    },
  };
}

function edgeGripParts({ screw, countersunk }: OfKind<"edgeGrip">, of: Of): Parts {
  const barrel = of("barrelLength");
  const slotEnd = barrel + of("slotWidth");
  const height = Math.max(of("height"), slotEnd);
  const edge = of("barrelDiameter") / 2;
  const inner = edge - of("gripDepth");
  const floor = of("floorThickness");
  const hole = Math.max(of("floorHole"), drawnScrew(screw).headDiameter);
  return {
    bodies: [
      turned("wood", -woodUnder(screw, floor), 0, of("barrelDiameter") * 1.5),
      turned("metal", 0, height, of("barrelDiameter")),
      turned("hollow", floor, height, hole),
      turned("hollow", 0, floor, of("floorHole")),
      ...screwBodies(screw, { seat: floor, countersunk }),
      {
        matter: "hollow",
        outline: [
          [barrel, inner],
          [slotEnd, inner],
          [slotEnd, edge],
          [barrel, edge],
        ],
      },
      {
        matter: "panel",
        outline: [
          [barrel, inner + 0.4],
          [barrel + Math.min(panelThickness, of("slotWidth")), inner + 0.4],
          [barrel + Math.min(panelThickness, of("slotWidth")), edge * 2],
          [barrel, edge * 2],
        ],
      },
    ],
    at: {
      barrelLength: along(0, barrel),
      slotWidth: along(barrel, slotEnd),
      height: along(0, height),
      floorThickness: along(0, floor),
      floorHole: across(floor / 2, of("floorHole")),
      barrelDiameter: across(barrel * 0.5, of("barrelDiameter")),
      gripDepth: { way: "across", at: (barrel + slotEnd) / 2, from: inner, to: edge },
    },
  };
}
