/**
 * Movement of wood per point of moisture and mm of width, radial (quartersawn) and tangential (flatsawn): Wood Handbook,
 * GTR-190 and GTR-282, table 13-5, valid from 6 to 14 % moisture. Species averages; a single board may differ by a fifth.
 * The softwoods and yellow-poplar are from memory and agree with the shrinkage of table 4-3.
 */
export type WoodMovement = { readonly species: string; readonly radial: number; readonly tangential: number };

const movement = (species: string, radial: number, tangential: number): WoodMovement => ({
  species,
  radial,
  tangential,
});

export const woodMovements: readonly WoodMovement[] = [
  movement("eastern white pine", 0.00071, 0.00212),
  movement("ponderosa pine", 0.00133, 0.00216),
  movement("sugar pine", 0.00099, 0.00194),
  movement("Douglas-fir, coast", 0.00165, 0.00267),
  movement("Douglas-fir, interior north", 0.0013, 0.00241),
  movement("Douglas-fir, interior west", 0.00165, 0.00263),
  movement("white fir", 0.00112, 0.00245),
  movement("sugar (hard) maple", 0.00165, 0.00353),
  movement("black walnut", 0.0019, 0.00274),
  movement("black cherry", 0.00126, 0.00248),
  movement("red oak, commercial", 0.00158, 0.00369),
  movement("white oak, commercial", 0.0018, 0.00365),
  movement("yellow-poplar", 0.00158, 0.00289),
  movement("American basswood", 0.0023, 0.0033),
  movement("American beech", 0.0019, 0.00431),
  movement("yellow birch", 0.00256, 0.00338),
  movement("paper birch", 0.00219, 0.00304),
  movement("white ash", 0.00169, 0.00274),
];

/** A species' movement; null for one that the table does not list. */
export function woodMovementOf(species: string): WoodMovement | null {
  return woodMovements.find((wood) => wood.species === species) ?? null;
}
