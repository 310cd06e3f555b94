import { z } from "zod";
import { colour, length, name, stockId } from "./schema-parts.ts";

/*
 * Stock as it was when it was chosen: its properties are copied into the document, so that a later change of the stock
 * list does not change a drawing.
 */

/** Sheet acrylic. */
export const acrylicSchema = z.strictObject({
  kind: z.literal("acrylic"),
  stockId,
  name,
  colour,
  look: z.enum(["opaque", "frosted", "clear", "mirror"]),
  process: z.enum(["cast", "extruded"]),
  facesDiffer: z.boolean(),
  densityKgM3: z.number().finite().positive().max(25_000),
});

export const woodSchema = z.strictObject({
  kind: z.literal("wood"),
  stockId,
  name,
  colour,
  /** Specific gravity at 12 % moisture on oven-dry mass, as the Wood Handbook lists it. */
  gravity: z.number().finite().positive().max(1.5),
  moisturePercent: z.number().finite().min(0).max(30),
  hardness: z.enum(["softwood", "hardwood"]),
  /** Movement across the grain per point of moisture, as the board is sawn (Wood Handbook, table 13-5). */
  movementPerPoint: z.number().finite().min(0).max(0.01),
});

export const adhesiveSchema = z.strictObject({
  stockId,
  name,
  family: z.enum([
    "solvent cement",
    "bodied cement",
    "cyanoacrylate",
    "epoxy",
    "neutral silicone",
    "high-bond tape",
    "wood glue",
  ]),
});

/** A wood screw. A flat head's length is over all, any other's from under the head. */
export const screwSchema = z.strictObject({
  name,
  /** Its number, as in ASME B18.6.1; null for a screw that is not made by number. */
  gauge: z.int().min(0).max(24).nullable(),
  head: z.enum(["flat", "pan", "round"]),
  diameter: length,
  length,
  headDiameter: length,
  headHeight: length,
});

/** A coat of the backer's finish, in the order they go on. */
export const coatSchema = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("sanding"), grit: z.int().min(24).max(3000) }),
  z.strictObject({ kind: z.literal("conditioner"), name, dryingHours: z.number().finite().min(0).max(720) }),
  z.strictObject({
    kind: z.literal("stain"),
    name,
    colour,
    /** Share of the way from the wood's colour to the stain's. */
    strength: z.number().finite().min(0).max(1),
    dryingHours: z.number().finite().min(0).max(720),
  }),
  z.strictObject({
    kind: z.literal("clear coat"),
    name,
    base: z.enum(["water-borne", "oil or shellac"]),
    dryingHours: z.number().finite().min(0).max(720),
  }),
  /** Whatever else the shop puts on; it does not change the colour drawn. */
  z.strictObject({ kind: z.literal("other"), name, dryingHours: z.number().finite().min(0).max(720) }),
]);
