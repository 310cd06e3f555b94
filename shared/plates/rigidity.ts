/** A flat sheet's stiffness. Modulus in N/mm² (MPa), thickness in mm, Poisson's ratio without unit. */
export type Sheet = { readonly modulus: number; readonly thickness: number; readonly poisson: number };

/** Acrylic's short-term modulus and Poisson's ratio (data pages after ISO 527 give 2800 to 3300 N/mm²; ratio from memory). */
export const acrylicSheet = { modulus: 3200, poisson: 0.37 } as const;

/** Under a lasting load acrylic creeps: half its modulus (common practice, no source). */
export const lastingShare = 0.5;

/** A plate's flexural rigidity E t³ / (12 (1 − ν²)) in N·mm (Timoshenko, Woinowsky-Krieger, Theory of Plates and Shells). */
export function rigidityNmm({ modulus, thickness, poisson }: Sheet): number {
  return (modulus * thickness ** 3) / (12 * (1 - poisson ** 2));
}

/** Standard gravity in m/s² (NIST SP 811). */
export const standardGravity = 9.80665;

/** A lying sheet's own weight in N/mm²: thickness in mm, density in kg/m³. */
export function ownWeight(thickness: number, densityKgM3: number): number {
  return densityKgM3 * 1e-9 * standardGravity * thickness;
}
