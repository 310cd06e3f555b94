/** A hash of a lattice point, 0 to 1 (integer mixing after Wang and Jenkins: multiply, shift, exclusive or). */
export function latticeValue(x: number, y: number, seed: number): number {
  let value = Math.imul(x, 374_761_393) ^ Math.imul(y, 668_265_263) ^ Math.imul(seed, 974_634_599);
  value = Math.imul(value ^ (value >>> 13), 1_274_126_177);
  return ((value ^ (value >>> 16)) >>> 0) / 4_294_967_295;
}

const eased = (share: number) => share * share * (3 - 2 * share);

/** Smooth value noise, 0 to 1, one bump a unit. */
export function noise(x: number, y: number, seed: number): number {
  const column = Math.floor(x);
  const row = Math.floor(y);
  const across = eased(x - column);
  const down = eased(y - row);
  const upperLeft = latticeValue(column, row, seed);
  const upper = upperLeft + (latticeValue(column + 1, row, seed) - upperLeft) * across;
  const lowerLeft = latticeValue(column, row + 1, seed);
  const lower = lowerLeft + (latticeValue(column + 1, row + 1, seed) - lowerLeft) * across;
  return upper + (lower - upper) * down;
}

/** A whole number that is the same for the same text: where a pattern that belongs to something named begins. */
export function seedOfText(text: string): number {
  return [...text].reduce((sum, character) => (sum * 31 + (character.codePointAt(0) ?? 0)) % 9973, 17);
}
