/**
 * Density of wood in kg/m³ at a moisture content in percent: 1000 · G · (1 + M/100), with G the specific gravity at 12
 * % moisture on oven-dry mass (Forest Products Laboratory, Wood Handbook, GTR-282, chapter 4).
 */
export function woodDensityKgM3(gravity: number, moisturePercent: number): number {
  return 1000 * gravity * (1 + moisturePercent / 100);
}

/** Mass in grams of a sheet: area in mm², thickness in mm, density in kg/m³. */
export function sheetMassG(areaMm2: number, thicknessMm: number, densityKgM3: number): number {
  return areaMm2 * thicknessMm * densityKgM3 * 1e-6;
}
