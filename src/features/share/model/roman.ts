const steps = [
  [1000, "M"],
  [900, "CM"],
  [500, "D"],
  [400, "CD"],
  [100, "C"],
  [90, "XC"],
  [50, "L"],
  [40, "XL"],
  [10, "X"],
  [9, "IX"],
  [5, "V"],
  [4, "IV"],
  [1, "I"],
] as const;

/** A whole number from 1 to 3999 in Roman figures, as plates of a book are numbered. Throws a RangeError outside. */
export function romanNumber(value: number): string {
  if (!Number.isInteger(value) || value < 1 || value > 3999) throw new RangeError(`No Roman figures for ${value}.`);
  let rest = value;
  let figures = "";
  for (const [worth, figure] of steps) {
    while (rest >= worth) {
      figures += figure;
      rest -= worth;
    }
  }
  return figures;
}
