import type { Adhesive } from "../mockup/document.ts";

/**
 * Generic families of adhesives, without trade names. Common practice throughout; the maker's sheet goes before it, and
 * every pair is tested on scrap first.
 */
export type Family = Adhesive["family"];

/** What a bond meets. A painted or mirrored back is a coating: a solvent lifts it. */
export type Surface = "acrylic" | "coated back" | "raw wood" | "finished wood";

export type FamilyFacts = {
  readonly family: Family;
  /** How it takes movement: what two materials may part by over the bond, mm. */
  readonly allowsMm: number;
  readonly gives: "rigid" | "gap-filling";
  /** Until the piece can be moved, and until the bond has its strength, at 20 °C. */
  readonly handlingHours: number;
  readonly fullHours: number;
  readonly cautions: readonly string[];
};

const rigid = { gives: "rigid", allowsMm: 0.1 } as const;
const gapFilling = { gives: "gap-filling", allowsMm: 1 } as const;
const onScrap = "Test on scrap of the same sheet and finish first.";
const flammable = "Flammable vapour: no flame, no spark, no hot surface near.";
const fume = "Fumes: work in moving air and keep off the vapour.";
const crazes = "Can craze laser-cut edges and engraved pockets: let them rest, anneal them, or take another family.";

const families: readonly FamilyFacts[] = [
  {
    family: "solvent cement",
    ...rigid,
    handlingHours: 0.5,
    fullHours: 24,
    cautions: [fume, flammable, crazes, "Runs where it can: mask faces that are seen.", onScrap],
  },
  {
    family: "bodied cement",
    ...rigid,
    handlingHours: 1,
    fullHours: 24,
    cautions: [fume, flammable, crazes, "Skins over within minutes and shrinks as it dries.", onScrap],
  },
  {
    family: "cyanoacrylate",
    ...rigid,
    handlingHours: 0.25,
    fullHours: 24,
    cautions: [
      fume,
      "Bonds skin at once; cotton and wool can catch heat from it.",
      "May bloom white on dark and clear sheets.",
      onScrap,
    ],
  },
  {
    family: "epoxy",
    ...gapFilling,
    handlingHours: 8,
    fullHours: 72,
    cautions: [
      "Irritates the skin and can sensitise it: wear gloves.",
      "Large batches heat up in the cup.",
      "Cures slowly in the cold.",
      onScrap,
    ],
  },
  {
    family: "neutral silicone",
    ...gapFilling,
    handlingHours: 24,
    fullHours: 168,
    cautions: [fume, "Cures from the edge inward, by the damp of the air: wide bonds take days.", onScrap],
  },
  {
    family: "high-bond tape",
    ...gapFilling,
    handlingHours: 0,
    fullHours: 72,
    cautions: [
      "Press it down hard all over, on clean dry faces, not in the cold.",
      "It can't be moved once set.",
      onScrap,
    ],
  },
  {
    family: "wood glue",
    ...rigid,
    handlingHours: 1,
    fullHours: 24,
    cautions: ["Needs clamping, and warmth while it dries.", onScrap],
  },
];

/** What is known of a family. */
export function familyFacts(family: Family): FamilyFacts {
  const facts = families.find((one) => one.family === family);
  if (!facts) throw new Error(`Nothing is written down about ${family}.`);
  return facts;
}

export type PairFit =
  | { readonly fits: true; readonly remarks: readonly string[] }
  | { readonly fits: false; readonly why: string };

const onFinish = "A bond on a finished face is as strong as the finish.";
const onCoating = "A bond on a painted or mirrored back is as strong as the coating.";

/** Whether a family bonds two surfaces, the same in both orders. */
export function pairFit(family: Family, one: Surface, other: Surface): PairFit {
  const surfaces = [one, other];
  const remarks = [
    ...(surfaces.includes("finished wood") ? [onFinish] : []),
    ...(surfaces.includes("coated back") ? [onCoating] : []),
  ];
  switch (family) {
    case "solvent cement":
    case "bodied cement":
      if (surfaces.includes("coated back")) {
        return { fits: false, why: "Solvent lifts paint and mirror backs. Take neutral silicone or high-bond tape." };
      }
      if (!surfaces.every((surface) => surface === "acrylic")) {
        return { fits: false, why: "Solvent melts acrylic into acrylic; wood has nothing that it could melt." };
      }
      return { fits: true, remarks: [] };
    case "cyanoacrylate":
      return { fits: true, remarks: [...remarks, ...(surfaces.some(isWood) ? ["On wood take a thick one."] : [])] };
    case "epoxy":
      if (surfaces.every((surface) => surface === "acrylic")) {
        return { fits: false, why: "It peels off smooth acrylic. Take a cement." };
      }
      return { fits: true, remarks: [...remarks, ...(surfaces.includes("acrylic") ? ["Roughen the acrylic."] : [])] };
    case "neutral silicone":
    case "high-bond tape":
      return {
        fits: true,
        remarks: surfaces.includes("raw wood")
          ? [...remarks, "Seal raw wood first: dust and fibres come off with it."]
          : remarks,
      };
    case "wood glue":
      if (!surfaces.every((surface) => surface === "raw wood")) {
        return { fits: false, why: "It needs to soak into raw wood on both sides." };
      }
      return { fits: true, remarks };
  }
}

const isWood = (surface: Surface): boolean => surface === "raw wood" || surface === "finished wood";

/** A joint made in two steps, with the hours between them and after. */
export type TwoStepJoint = {
  readonly name: string;
  readonly first: Family;
  readonly second: Family;
  readonly betweenHours: number;
  readonly restHours: number;
};

/** Acrylic to acrylic: a tack with a bodied cement holds the place, a wicking one then runs into the joint (common practice). */
export const tackAndWick: TwoStepJoint = {
  name: "tack, then wick",
  first: "bodied cement",
  second: "solvent cement",
  betweenHours: 0.25,
  restHours: 12,
};

/** A tack of any family, and another that bonds after it: the waits of `tackAndWick` between and after (common practice). */
export const tackThenBond = (tack: Family, bond: Family): TwoStepJoint => ({
  ...tackAndWick,
  name: "tack, then bond",
  first: tack,
  second: bond,
});

/** Hours until a joint may be loaded: of one family its own, of two steps both and the rest between and after. */
export function waitingHours(joint: Family | TwoStepJoint): { readonly handling: number; readonly full: number } {
  if (typeof joint === "string") {
    const { handlingHours, fullHours } = familyFacts(joint);
    return { handling: handlingHours, full: fullHours };
  }
  const second = familyFacts(joint.second);
  return {
    handling: joint.betweenHours + second.handlingHours,
    full: joint.betweenHours + Math.max(joint.restHours, familyFacts(joint.first).fullHours, second.fullHours),
  };
}
