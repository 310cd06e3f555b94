import { z } from "zod";

const share = z.number().finite().min(0).max(1);
const mm = z.number().finite().min(0).max(10_000);

/** The limits of the dry fit, each the shop's to set. Where no source is named the default is common practice. */
export const limitsSchema = z.strictObject({
  /** Rule 1: share of a bonded piece's area off its support, and how far it reaches over. */
  unsupportedCaution: share.default(0.1),
  unsupportedStop: share.default(0.3),
  reachMm: mm.default(10),
  /** Rule 3: thinnest stroke of a free or overhanging piece, and of one that is bonded all over. */
  freeStrokeMm: mm.default(2),
  bondedStrokeMm: mm.default(1.5),
  /** Rule 6: how far a hole may be drilled from its place, how far cap and barrel reach over its edge. */
  placingErrorMm: mm.default(0.5),
  coverMm: mm.default(1),
  /** Movement of acrylic: 7e-5 per kelvin (ASTM D696 values lie at 7e-5 to 8e-5). The spans are our choice. */
  expansionPerK: z.number().finite().min(0).max(0.001).default(7e-5),
  temperatureInsideK: z.number().finite().min(0).max(100).default(20),
  temperatureOutsideK: z.number().finite().min(0).max(100).default(40),
  /** Movement of the backer: how far its moisture goes either way. Our choice. */
  moisturePoints: z.number().finite().min(0).max(20).default(4),
  /** Rule 7: from a hole's centre to the nearest edge in hole diameters, and the web in sheet thicknesses. */
  edgeDiameters: z.number().finite().min(0).max(10).default(2),
  webThicknesses: z.number().finite().min(0).max(10).default(1),
  /** Rule 21: the bed of the machine. Our choice, until the shop states its own. */
  bedWidthMm: mm.positive().default(900),
  bedHeightMm: mm.positive().default(600),
  /** Rule 23: ΔE00 of stock against artwork. */
  colourRemark: z.number().finite().min(0).max(100).default(2),
  colourCaution: z.number().finite().min(0).max(100).default(5),
});

export type Limits = z.infer<typeof limitsSchema>;

export const defaultLimits: Limits = limitsSchema.parse({});
