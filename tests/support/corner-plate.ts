/**
 * Deflection in the middle of a rectangular plate on its four corners, by the Ritz method: the polynomials in x² and y²
 * that make the plate's energy least and are nothing at the corners. Gives w·D/(q a⁴) for an even load and w·D/(P a²)
 * for a push in the middle, with a the longer side and `ratio` the longer over the shorter one.
 */
export function cornerPlate(plate: {
  readonly ratio: number;
  readonly poisson: number;
  readonly load: "even" | "middle";
}): number {
  const { ratio, poisson, load } = plate;
  const powers = Array.from({ length: terms * terms }, (_, k) => [2 * (k % terms), 2 * Math.floor(k / terms)] as const);
  // x runs over −1 to 1 along the longer side, y along the shorter one.
  const perX = 2;
  const perY = 2 * ratio;
  const area = 1 / (perX * perY);
  const size = powers.length + 1;
  const matrix = Array.from({ length: size }, () => new Float64Array(size + 1));
  for (const [row, [i, j]] of powers.entries()) {
    const line = matrix[row];
    if (!line) continue;
    for (const [column, [k, l]] of powers.entries()) {
      line[column] = area * stiffness(i, j, k, l, perX, perY, poisson);
    }
    // The corner's condition, and its force beside it.
    line[size - 1] = 1;
    const last = matrix[size - 1];
    if (last) last[row] = 1;
    line[size] = load === "even" ? area * mean(i, j) : i === 0 && j === 0 ? 1 : 0;
  }
  return solve(matrix)[0] ?? Number.NaN;
}

const terms = 7;

/** ∫ of xᵐ yⁿ over the square from −1 to 1. */
function mean(m: number, n: number): number {
  return m % 2 === 1 || n % 2 === 1 || m < 0 || n < 0 ? 0 : 4 / ((m + 1) * (n + 1));
}

/** Bending energy of two terms: ∫ w_xx v_xx + w_yy v_yy + ν (w_xx v_yy + w_yy v_xx) + 2 (1 − ν) w_xy v_xy. */
function stiffness(i: number, j: number, k: number, l: number, perX: number, perY: number, poisson: number): number {
  const second = (n: number) => n * (n - 1);
  const xx = perX ** 4 * second(i) * second(k) * mean(i + k - 4, j + l);
  const yy = perY ** 4 * second(j) * second(l) * mean(i + k, j + l - 4);
  const both = perX ** 2 * perY ** 2 * mean(i + k - 2, j + l - 2);
  const mixed = both * (second(i) * second(l) + second(j) * second(k));
  const twist = both * i * j * k * l;
  return xx + yy + poisson * mixed + 2 * (1 - poisson) * twist;
}

/** Gauss's elimination with the largest pivot of each column. */
function solve(matrix: Float64Array[]): number[] {
  const size = matrix.length;
  for (let column = 0; column < size; column++) {
    let pivot = column;
    for (let row = column + 1; row < size; row++) {
      if (Math.abs(matrix[row]?.[column] ?? 0) > Math.abs(matrix[pivot]?.[column] ?? 0)) pivot = row;
    }
    const chosen = matrix[pivot];
    const other = matrix[column];
    if (!chosen || !other) throw new Error("The system has no rows.");
    matrix[pivot] = other;
    matrix[column] = chosen;
    for (let row = 0; row < size; row++) {
      const line = matrix[row];
      if (!line || row === column) continue;
      const factor = (line[column] ?? 0) / (chosen[column] ?? 1);
      for (let at = column; at <= size; at++) line[at] = (line[at] ?? 0) - factor * (chosen[at] ?? 0);
    }
  }
  return matrix.map((line, row) => (line[size] ?? 0) / (line[row] ?? 1));
}
