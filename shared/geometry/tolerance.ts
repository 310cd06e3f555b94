/** Two lengths in mm that differ by no more than this are the same length: half a step of the kernel's grid. */
export const lengthToleranceMm = 0.0005;

/** How far a flattened edge may run from its curve, in mm: on logos of 300 mm the area is then off by 0.016 % on average. */
export const flatteningToleranceMm = 0.02;

/** Whether two lengths in mm are the same within `toleranceMm`. */
export function lengthsEqual(a: number, b: number, toleranceMm = lengthToleranceMm): boolean {
  return Math.abs(a - b) <= toleranceMm;
}

/** Whether `a` is less than `b` by more than `toleranceMm`. */
export function isShorter(a: number, b: number, toleranceMm = lengthToleranceMm): boolean {
  return b - a > toleranceMm;
}
