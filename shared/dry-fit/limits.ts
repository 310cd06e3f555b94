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
  /** Rule 4: narrowest gap inside one piece. */
  gapMm: mm.default(1.5),
  /** Rule 6: how far a hole may be drilled from its place, how far cap and barrel reach over its edge. */
  placingErrorMm: mm.default(0.5),
  coverMm: mm.default(1),
  /** Movement of acrylic: 7e-5 per kelvin (ASTM D696 values lie at 7e-5 to 8e-5). The spans are our choice. */
  expansionPerK: z.number().finite().min(0).max(0.001).default(7e-5),
  temperatureInsideK: z.number().finite().min(0).max(100).default(20),
  temperatureOutsideK: z.number().finite().min(0).max(100).default(40),
  /** Movement of the backer: how far its moisture goes either way. Our choice. */
  moisturePoints: z.number().finite().min(0).max(20).default(4),
  /** Rule 17: how far two materials may part over a bond, by how the adhesive gives. */
  rigidBondMm: mm.default(0.1),
  gapFillingBondMm: mm.default(1),
  /** Rule 7: from a hole's centre to the nearest edge in hole diameters, and the web in sheet thicknesses. */
  edgeDiameters: z.number().finite().min(0).max(10).default(2),
  webThicknesses: z.number().finite().min(0).max(10).default(1),
  /** Rule 8: stud in the barrel and glued stud in the wood in stud diameters; slot over sheet; slot over the panel's edge. */
  gripDiameters: z.number().finite().min(0).max(10).default(1),
  studDiameters: z.number().finite().min(0).max(10).default(2),
  slotPlayMm: mm.default(2.5),
  edgeGripMm: mm.default(3),
  /** Rule 10: what sanding takes off the wood's face, and what must be left under a point. */
  sandingMm: mm.default(0.3),
  skinMm: mm.default(2),
  /** Rule 11: how far a screw or stud must come past the slat into the substrate. */
  slatHoldMm: mm.default(6),
  /** Rule 12: what published loads are divided by, and from which share on a load outside their range is a caution. */
  lateralDivisor: z.number().finite().min(1).max(20).default(2),
  withdrawalDivisor: z.number().finite().min(5).max(20).default(5.5),
  unprovenLoadShare: share.default(0.25),
  /** Rule 13: round a cap to whatever lies beside it. */
  capClearanceMm: mm.default(0.5),
  /** Rule 14: share of a barrel's foot on what it stands on, and from its middle to a brad. */
  footShare: share.default(0.8),
  footBradMm: mm.max(200).default(10),
  /** Rule 15: a push by hand, and how far a panel may give way: the larger of a length and a part of the spacing. */
  pushN: z.number().finite().min(0).max(10_000).default(100),
  bendMm: mm.default(1),
  bendPart: z.number().finite().min(10).max(10_000).default(300),
  /** Rule 16: how far a glued stud may be bent by the panel's movement. */
  studGiveMm: mm.default(0.5),
  /**
   * Rule 19: what must be left under a pocket, of the thickness of what is cut (a third); the gap a side; what the cutters
   * take away where their path follows the line, 0 where it is already set off by half of it.
   */
  pocketFloorShare: share.default(0.3333),
  pocketGapLeastMm: mm.default(0.05),
  pocketGapMostMm: mm.default(0.25),
  pieceKerfMm: mm.max(10).default(0.15),
  pocketKerfMm: mm.max(10).default(0),
  /** Rule 21: the bed of the machine. Our choice, until the shop states its own. */
  bedWidthMm: mm.positive().default(900),
  bedHeightMm: mm.positive().default(600),
  /** Rule 22: share of a sheet that the pieces laid on it cover at most. Our choice. */
  sheetShare: z.number().finite().min(0.05).max(1).default(0.7),
  /** Rule 23: ΔE00 of stock against artwork. */
  colourRemark: z.number().finite().min(0).max(100).default(2),
  colourCaution: z.number().finite().min(0).max(100).default(5),
  /** Rule 25: how lettering stands out: WCAG's ratio, and points of light reflectance. */
  contrastRatio: z.number().finite().min(1).max(21).default(3),
  contrastPoints: z.number().finite().min(0).max(100).default(30),
  /** Rule 28: a piece whose longer side is under it is lost easily. */
  smallPieceMm: mm.default(8),
  /** Rule 29: how far a piece and its mirror image may differ and still fit. Our choice. */
  mirrorMm: mm.default(0.15),
  /** Rule 30: outlines that differ by less are the same piece; up to the others an eye takes one for another. Our choice. */
  twinSameMm: mm.default(0.1),
  twinAlikeMm: mm.default(0.75),
  twinAlikeShare: share.default(0.04),
  /**
   * Rule 31: the brads in slats and how far they come past them, how far inside the trim line none is; a frame's brads, and how
   * far they come into the board's edge.
   */
  bradLengthMm: mm.min(1).max(200).default(18),
  bradHoldMm: mm.default(5),
  bradTrimMm: mm.max(200).default(15),
  frameBradLengthMm: mm.min(1).max(200).default(30),
  frameBradHoldMm: mm.default(10),
  /** Rule 33: how far the saw turns, degrees off a square cut. */
  sawSettingMost: z.number().finite().min(0).max(90).default(50),
  /** Rules 36 and 38: hardware, adhesive and finish over the mass that is worked out, and what is too heavy for the shop alone. Our choice. */
  unweighedShare: share.default(0.2),
  heaviestKg: z.number().finite().positive().max(10_000).default(25),
  /** Rule 37: how far a sign may reach out over a walkway (4 in, 2010 ADA Standards, 307, from memory). */
  protrusionMm: mm.default(102),
});

export type Limits = z.infer<typeof limitsSchema>;

export const defaultLimits: Limits = limitsSchema.parse({});
