import { isShorter } from "../../geometry/tolerance.ts";
import type { Hardware, Hole } from "../../mockup/document.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { holeWindowMends } from "../mends/hole-window-mends.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { type StandoffLayer, standoffLayers } from "../standoff-layers.ts";
import { isEmptyWindow, windowOfHole } from "../window-of-hole.ts";
import { layerWords } from "../words.ts";

const source = "arithmetic; play and cover are common practice";

/** Rule 6: a hole wide enough for its stud to move and narrow enough to hide under its cap. */
export const holeWindow: Rule = { number: 6, title: "Hole window", check, mends: holeWindowMends };

function check(input: RuleInput): Finding[] {
  return standoffLayers(input).flatMap((standing) =>
    standing.hold.holes.flatMap((hole) => checkHole(standing, hole, input)),
  );
}

function checkHole({ layer, hold }: StandoffLayer, hole: Hole, input: RuleInput): Finding[] {
  const { hardware } = hold;
  const window = windowOfHole(hold, hole, input);
  const passing = passingOf(hardware);
  if (!window || !passing) return [];
  const { lower, upper, movement } = window;
  const mm = (length: number) => formatFine(length, input.context.unit);
  const base = {
    severity: "stop" as const,
    layerKey: layer.key,
    holeId: hole.id,
    where: { x: hole.x, y: hole.y },
    unit: "mm",
    source,
  };
  const stud = `${mm(passing.diameter)} ${passing.what}`;
  // From behind barrel or spacer hide it, and the narrower of both sides counts.
  const behind = `${mm(hardware.barrelDiameter)} ${hardware.kind === "throughScrew" ? "spacer" : "barrel"}`;
  const hides = hardware.barrelDiameter < passing.cover ? behind : `${mm(passing.cover)} ${passing.coverWhat}`;
  const play = `${mm(input.limits.placingErrorMm)} placing error a side and ${mm(movement)} of movement`;
  if (isEmptyWindow(window)) {
    const text = `No hole of ${layerWords(layer)} can be right here: the ${stud} needs ${mm(lower)} for ${play}, but from ${mm(upper)} on the hole shows round the ${hides}. Take a wider cap, or bring this hole and the fixed one nearer each other.`;
    return [foundBy(holeWindow, { ...base, text, value: lower, limit: upper })];
  }
  if (isShorter(hole.diameter, lower)) {
    const text = `A hole of ${layerWords(layer)} is ${mm(hole.diameter)} wide; the ${stud} needs at least ${mm(lower)} for ${play}, or the panel binds and cracks.`;
    return [foundBy(holeWindow, { ...base, text, value: hole.diameter, limit: lower })];
  }
  if (isShorter(upper, hole.diameter)) {
    const text = `A hole of ${layerWords(layer)} is ${mm(hole.diameter)} wide; over ${mm(upper)} it can show round the ${hides}, for ever.`;
    return [foundBy(holeWindow, { ...base, text, value: hole.diameter, limit: upper })];
  }
  return [];
}

/** What goes through the panel and what hides its hole, in words. */
function passingOf(
  hardware: Hardware,
): { readonly diameter: number; readonly what: string; readonly cover: number; readonly coverWhat: string } | null {
  switch (hardware.kind) {
    case "capStud":
      return { diameter: hardware.studDiameter, what: "stud", cover: hardware.capDiameter, coverWhat: "cap" };
    case "throughScrew": {
      const { screw, cap } = hardware;
      const hidden = cap !== null && cap.diameter > screw.headDiameter;
      const cover = hidden ? cap.diameter : screw.headDiameter;
      return { diameter: screw.diameter, what: "screw", cover, coverWhat: hidden ? "cap" : "head" };
    }
    case "blindStud":
    case "edgeGrip":
      return null;
  }
}
