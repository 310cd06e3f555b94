import type { TraceChoices } from "#shared/tracing/trace-choices.ts";

export const smoothingWords: Readonly<Record<TraceChoices["smoothing"], string>> = {
  close: "As close as the pixels allow",
  usual: "As drawn (usual)",
  smooth: "Smooth, for noisy edges",
  smoothest: "Smoothest, for rough scans",
};

export const backgroundWords: Readonly<Record<TraceChoices["background"], string>> = {
  automatic: "Leave it out if it is white",
  everywhere: "Leave it out everywhere",
  around: "Leave it out around the logo only",
  kept: "Keep it as a piece",
};

/** An area in mm², with as many digits as tell. */
export const formatArea = (mm2: number): string => `${Number(mm2.toPrecision(2)).toLocaleString("en")} mm²`;

/** The choices with what becomes of one colour: cut, dropped, or joined into another. */
export function withColour(
  choices: TraceChoices,
  colour: string,
  becomes: "cut" | "drop" | { readonly into: string },
): TraceChoices {
  const joined = choices.joined.filter(({ from }) => from !== colour);
  const dropped = choices.dropped.filter((other) => other !== colour);
  if (becomes === "cut") return { ...choices, joined, dropped };
  if (becomes === "drop") return { ...choices, joined, dropped: [...dropped, colour] };
  // What was joined into this colour would otherwise turn in a circle.
  const straight = joined.filter(({ from, into }) => from !== becomes.into || into !== colour);
  return { ...choices, joined: [...straight, { from: colour, into: becomes.into }], dropped };
}
