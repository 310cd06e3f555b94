import type { Coat } from "#shared/mockup/document.ts";

/**
 * A coat while it is being written. What its kind has no field for is kept too, so that a coat that was another kind for a
 * moment is what it was. null is an empty field, NaN one that can't be read; `strength` is a share.
 */
export type CoatDraft = {
  readonly id: string;
  readonly kind: Coat["kind"];
  readonly grit: number | null;
  readonly name: string;
  readonly colour: string;
  readonly strength: number | null;
  readonly base: "water-borne" | "oil or shellac";
  readonly dryingHours: number | null;
};

export type CoatProblems = Partial<Record<"grit" | "name" | "strength" | "dryingHours", string>>;

/** The document takes no more. */
export const mostCoats = 12;

/** How a new coat of each kind begins, until the shop writes what it uses: our choice. */
const beginnings: Readonly<Record<Coat["kind"], Coat>> = {
  sanding: { kind: "sanding", grit: 180 },
  conditioner: { kind: "conditioner", name: "Wood conditioner", dryingHours: 1 },
  stain: { kind: "stain", name: "Stain", colour: "#6B4A2B", strength: 0.5, dryingHours: 8 },
  "clear coat": { kind: "clear coat", name: "Clear coat", base: "water-borne", dryingHours: 2 },
  other: { kind: "other", name: "", dryingHours: 0 },
};

const blank: Omit<CoatDraft, "id" | "kind"> = {
  grit: 180,
  name: "",
  colour: "#6B4A2B",
  strength: 0.5,
  base: "water-borne",
  dryingHours: 0,
};

export const draftOfCoat = (coat: Coat, id: string): CoatDraft => ({ ...blank, ...coat, id });

export const newCoat = (kind: Coat["kind"], id: string): CoatDraft => draftOfCoat(beginnings[kind], id);

/** What stands in the way of taking a coat, by field; empty when nothing does. */
export function coatProblems({ kind, grit, name, strength, dryingHours }: CoatDraft): CoatProblems {
  if (kind === "sanding") {
    const isGrit = grit !== null && Number.isInteger(grit) && grit >= 24 && grit <= 3000;
    return isGrit ? {} : { grit: "A whole number from 24 to 3000." };
  }
  return {
    ...(name.trim() === "" ? { name: "Give the coat a name." } : {}),
    ...(kind === "stain" && !isWithin(strength, 1) ? { strength: "From 0 to 100." } : {}),
    ...(isWithin(dryingHours, 720) ? {} : { dryingHours: "From 0 to 720 hours." }),
  };
}

/** The coat as the document keeps it; null while something is missing or out of its range. */
export function coatOf(draft: CoatDraft): Coat | null {
  const { kind, grit, colour, strength, base, dryingHours } = draft;
  if (Object.keys(coatProblems(draft)).length > 0) return null;
  const name = draft.name.trim();
  if (kind === "sanding") return grit === null ? null : { kind, grit };
  if (dryingHours === null) return null;
  if (kind === "stain") return strength === null ? null : { kind, name, colour, strength, dryingHours };
  return kind === "clear coat" ? { kind, name, base, dryingHours } : { kind, name, dryingHours };
}

/** Coats that can be taken, in their order: what the wood looks like while one of them is still being written. */
export const coatsOf = (drafts: readonly CoatDraft[]): Coat[] => drafts.flatMap((draft) => coatOf(draft) ?? []);

/** The coat one place earlier (−1) or later (1); the same list at either end. */
export function moveCoat(drafts: readonly CoatDraft[], id: string, by: -1 | 1): readonly CoatDraft[] {
  const from = drafts.findIndex((draft) => draft.id === id);
  const [coat, neighbour] = [drafts[from], drafts[from + by]];
  if (!coat || !neighbour) return drafts;
  return drafts.map((draft, index) => (index === from ? neighbour : index === from + by ? coat : draft));
}

function isWithin(value: number | null, most: number): boolean {
  return value !== null && value >= 0 && value <= most;
}
