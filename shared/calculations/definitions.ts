import { bondCalculations } from "./bond-calculations.ts";
import type { CalculationGroup } from "./calculation.ts";
import { costCalculations } from "./cost-calculations.ts";
import { drawingCalculations } from "./drawing-calculations.ts";
import { frameCalculations } from "./frame-calculations.ts";
import { holeCalculations } from "./hole-calculations.ts";
import { legibilityCalculations } from "./legibility-calculations.ts";
import { loadCalculations } from "./load-calculations.ts";
import { pieceCalculations } from "./piece-calculations.ts";
import { screwCalculations } from "./screw-calculations.ts";
import { sheetCalculations } from "./sheet-calculations.ts";
import { slatCalculations } from "./slat-calculations.ts";
import { stockLengthCalculations } from "./stock-length-calculations.ts";

/** Every calculation there is, in the order a sign is built. A new one is added to its group and nowhere else. */
export const calculations: readonly CalculationGroup[] = [
  pieceCalculations,
  slatCalculations,
  frameCalculations,
  bondCalculations,
  holeCalculations,
  screwCalculations,
  loadCalculations,
  legibilityCalculations,
  stockLengthCalculations,
  sheetCalculations,
  costCalculations,
  drawingCalculations,
];
