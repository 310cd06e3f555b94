import { isShorter } from "../geometry/tolerance.ts";
import { checkScrew } from "../materials/check-screw.ts";
import type { StockFault } from "../materials/stock-fault.ts";
import type { CapStud, Hardware } from "../mockup/document.ts";
import { formatFine } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { barrelAddsUp } from "./barrel-offset.ts";

/** Larger than any standoff, mm. */
const largest = 500;

type ThroughScrew = Extract<Hardware, { kind: "throughScrew" }>;
type EdgeGrip = Extract<Hardware, { kind: "edgeGrip" }>;
/** At a field, or at one within it after a dot. */
type Say = (field: string, detail: string) => void;
type Written = (mm: number) => string;

/**
 * Which of a standoff's measures can't be true together, each at the field that is most likely wrong; lengths in the
 * words are written in `unit`. Whether it suits a panel is for the dry fit to say.
 */
export function checkHardware(hardware: Hardware, unit: LengthUnit): StockFault[] {
  const faults: StockFault[] = [];
  const say: Say = (field, detail) => faults.push({ path: field.split("."), detail });
  const written: Written = (mm) => formatFine(mm, unit);
  for (const [field, value] of Object.entries(hardware)) {
    if (typeof value === "number" && value > largest) say(field, `At most ${written(largest)}.`);
  }
  if ("screw" in hardware) {
    const ofScrew = checkScrew(hardware.screw, unit);
    faults.push(...ofScrew.map(({ path, detail }) => ({ path: ["screw", ...path], detail })));
  }
  switch (hardware.kind) {
    case "capStud":
      checkFloor(hardware, say, written);
      checkCapStud(hardware, say, written);
      break;
    case "throughScrew":
      checkThroughScrew(hardware, say, written);
      break;
    case "blindStud":
      if (hardware.barrelLength > 0 && !isShorter(hardware.studDiameter, hardware.barrelDiameter))
        say("barrelDiameter", `The spacer is wider than its stud of ${written(hardware.studDiameter)}.`);
      if (!isShorter(hardware.barrelLength, hardware.studLength))
        say(
          "studLength",
          `The stud passes a spacer of ${written(hardware.barrelLength)} and must reach into the wood.`,
        );
      break;
    case "edgeGrip":
      checkFloor(hardware, say, written);
      checkEdgeGrip(hardware, say, written);
      break;
  }
  return faults;
}

/** The floor that a barrel is screwed down by. */
function checkFloor({ floorHole, floorThickness, countersunk, screw }: CapStud | EdgeGrip, say: Say, written: Written) {
  if (isShorter(floorHole, screw.diameter))
    say("floorHole", `The screw's shank is ${written(screw.diameter)}; it needs a hole at least that wide.`);
  else if (!isShorter(floorHole, screw.headDiameter))
    say("floorHole", `The screw's head of ${written(screw.headDiameter)} would fall through.`);
  if (!isShorter(floorThickness, screw.length))
    say("floorThickness", `The screw is ${written(screw.length)} long and must come out below the floor.`);
  if (countersunk && screw.head !== "flat") say("countersunk", `A ${screw.head} head sits on a plain floor.`);
}

function checkCapStud(hardware: CapStud, say: Say, written: Written) {
  const { barrelDiameter, barrelLength, boreDiameter, boreDepth, floorThickness, screw } = hardware;
  if (!barrelAddsUp(hardware)) {
    const sum = written(boreDepth + floorThickness);
    say(
      "barrelLength",
      `Bore and floor make ${sum}, the barrel is ${written(barrelLength)}. One of the three is wrong.`,
    );
  }
  if (isShorter(boreDiameter, screw.headDiameter))
    say("boreDiameter", `The screw's head of ${written(screw.headDiameter)} would not go down.`);
  else if (isShorter(boreDiameter, hardware.studDiameter))
    say("boreDiameter", `The stud of ${written(hardware.studDiameter)} would not go in.`);
  if (!isShorter(boreDiameter, barrelDiameter))
    say("barrelDiameter", `The barrel is wider than its bore of ${written(boreDiameter)}.`);
  if (!isShorter(hardware.studDiameter, hardware.capDiameter))
    say("capDiameter", `The cap hides the hole, so it is wider than the stud of ${written(hardware.studDiameter)}.`);
}

function checkThroughScrew(hardware: ThroughScrew, say: Say, written: Written) {
  const { barrelDiameter, barrelLength, boreDiameter, washerThickness, cap, screw } = hardware;
  if (isShorter(boreDiameter, screw.diameter))
    say("boreDiameter", `The screw of ${written(screw.diameter)} would not pass.`);
  if (!isShorter(boreDiameter, barrelDiameter))
    say("barrelDiameter", `The spacer is wider than its bore of ${written(boreDiameter)}.`);
  if (cap && isShorter(cap.diameter, screw.headDiameter))
    say("cap.diameter", `The cap goes over the screw's head of ${written(screw.headDiameter)}.`);
  if (!isShorter(barrelLength + washerThickness, screw.length)) {
    const passed = written(barrelLength + washerThickness);
    say(
      "barrelLength",
      `The screw of ${written(screw.length)} passes ${passed} of spacer and must reach into the wood.`,
    );
  }
}

function checkEdgeGrip(hardware: EdgeGrip, say: Say, written: Written) {
  const { barrelDiameter, barrelLength, floorThickness, slotWidth, gripDepth, height } = hardware;
  if (isShorter(barrelLength, floorThickness))
    say("barrelLength", `The slot begins above the floor of ${written(floorThickness)}.`);
  if (isShorter(height, barrelLength + slotWidth))
    say("height", `The slot ends at ${written(barrelLength + slotWidth)}; the front can't lie lower.`);
  if (!isShorter(gripDepth, barrelDiameter))
    say("gripDepth", `The slot is cut into a holder ${written(barrelDiameter)} across and can't be deeper.`);
}
