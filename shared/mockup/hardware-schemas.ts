import { z } from "zod";
import { colour, length, name, stockId } from "./schema-parts.ts";
import { screwSchema } from "./stock-schemas.ts";

const allowance = z.number().finite().min(0).max(100);

/** What every standoff has. All mm. `barrelDiameter` is that of the foot that stands on the wood. */
const standoff = { stockId, name, finish: colour, barrelDiameter: length };

/** How a barrel is screwed down. */
const floor = {
  floorThickness: length,
  floorHole: length,
  countersunk: z.boolean(),
  screw: screwSchema,
};

/** A barrel screwed to the backer; the cap's stud passes the panel. */
export const capStudSchema = z.strictObject({
  kind: z.literal("capStud"),
  ...standoff,
  ...floor,
  /** Bore depth plus floor thickness: the height the panel's back stands above the wood. */
  barrelLength: length,
  boreDiameter: length,
  boreDepth: length,
  studDiameter: length,
  studLength: length,
  capDiameter: length,
  capThickness: length,
});

/** A loose spacer; the screw passes cap or washer, panel and spacer into the wood. */
export const throughScrewSchema = z.strictObject({
  kind: z.literal("throughScrew"),
  ...standoff,
  barrelLength: length,
  boreDiameter: length,
  /** Under the panel, between it and the spacer. */
  washerThickness: allowance,
  /** Over the screw's head; without one the head itself is seen. */
  cap: z.strictObject({ diameter: length, thickness: length }).nullable(),
  screw: screwSchema,
});

/** A stud fixed to the panel's back and let into the wood; nothing is seen from the front. */
export const blindStudSchema = z.strictObject({
  kind: z.literal("blindStud"),
  ...standoff,
  /** A spacer on the stud; 0 without one, where the glue holds the offset. */
  barrelLength: allowance,
  studDiameter: length,
  /** From the panel's back. */
  studLength: length,
});

/** A holder screwed to the backer that takes the panel's edge in a slot. */
export const edgeGripSchema = z.strictObject({
  kind: z.literal("edgeGrip"),
  ...standoff,
  ...floor,
  /** Height of the slot's lower side above the wood: where the panel's back lies. */
  barrelLength: length,
  slotWidth: length,
  /** How far the slot reaches over the panel's edge. */
  gripDepth: length,
  /** From the wood to its front. */
  height: length,
});

export const hardwareSchema = z.discriminatedUnion("kind", [
  capStudSchema,
  throughScrewSchema,
  blindStudSchema,
  edgeGripSchema,
]);
