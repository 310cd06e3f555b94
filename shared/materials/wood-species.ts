import type { Wood } from "../mockup/document.ts";
import { woodMovementOf, woodMovements } from "./wood-movement.ts";

/** How a board was sawn: which way its width moves most. */
export type Sawn = "flatsawn" | "quartersawn";

/**
 * A species as the Wood Handbook lists it: specific gravity at 12 % moisture on oven-dry mass (GTR-282, table 5-3; white
 * fir and the two interior Douglas-firs from memory), and a usual colour of a planed board, which is our own estimate.
 */
export type WoodSpecies = {
  readonly species: string;
  readonly gravity: number;
  readonly hardness: Wood["hardness"];
  readonly colour: string;
};

const species = (name: string, gravity: number, hardness: WoodSpecies["hardness"], colour: string): WoodSpecies => ({
  species: name,
  gravity,
  hardness,
  colour,
});

/** Every species whose movement is known, softwoods first. */
export const woodSpecies: readonly WoodSpecies[] = [
  species("eastern white pine", 0.35, "softwood", "#E6CFA4"),
  species("ponderosa pine", 0.4, "softwood", "#E2C697"),
  species("sugar pine", 0.36, "softwood", "#E8D5AE"),
  species("Douglas-fir, coast", 0.48, "softwood", "#CF9F6B"),
  species("Douglas-fir, interior north", 0.48, "softwood", "#CF9F6B"),
  species("Douglas-fir, interior west", 0.5, "softwood", "#CF9F6B"),
  species("white fir", 0.39, "softwood", "#E9DCC0"),
  species("sugar (hard) maple", 0.63, "hardwood", "#E3CFAE"),
  species("black walnut", 0.55, "hardwood", "#6B4A33"),
  species("black cherry", 0.5, "hardwood", "#A8683F"),
  species("red oak, commercial", 0.63, "hardwood", "#C49A6C"),
  species("white oak, commercial", 0.68, "hardwood", "#C3A273"),
  species("yellow-poplar", 0.42, "hardwood", "#CFC79A"),
  species("American basswood", 0.37, "hardwood", "#E5D5B5"),
  species("American beech", 0.64, "hardwood", "#D2AC80"),
  species("yellow birch", 0.62, "hardwood", "#DDBE92"),
  species("paper birch", 0.55, "hardwood", "#E2CBA0"),
  species("white ash", 0.6, "hardwood", "#D8C3A0"),
];

/** What the table says of a board of that species: all that follows from the species and how it was sawn. */
export function boardOfSpecies(
  name: string,
  sawn: Sawn,
): Pick<Wood, "gravity" | "hardness" | "movementPerPoint" | "colour"> | null {
  const found = woodSpecies.find((one) => one.species === name);
  const movement = woodMovementOf(name);
  if (!found || !movement) return null;
  const { gravity, hardness, colour } = found;
  return {
    gravity,
    hardness,
    colour,
    movementPerPoint: sawn === "flatsawn" ? movement.tangential : movement.radial,
  };
}

/** The species and sawing that a board's figures are those of, the first in the table; null when they are nobody's. */
export function speciesOfBoard({
  gravity,
  movementPerPoint,
}: Pick<Wood, "gravity" | "movementPerPoint">): { readonly species: string; readonly sawn: Sawn } | null {
  for (const { species: name, radial, tangential } of woodMovements) {
    if (woodSpecies.find((one) => one.species === name)?.gravity !== gravity) continue;
    if (tangential === movementPerPoint) return { species: name, sawn: "flatsawn" };
    if (radial === movementPerPoint) return { species: name, sawn: "quartersawn" };
  }
  return null;
}
