import { z } from "zod";
import { colour, coordinate, id, length } from "./schema-parts.ts";

/** Artwork that a piece's outline goes back to, so that it is known whose it is. */
const artworkIds = z.array(z.uuid()).max(50);

/** Where a piece's outline comes from. Whatever it is, the outline itself stands in the piece. */
export const pieceSourceSchema = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("artwork"), artworkId: z.uuid(), index: z.int().min(0), colour }),
  /** A plain shape by its measures: nobody's drawing. */
  z.strictObject({ kind: z.literal("plate") }),
  z.strictObject({
    kind: z.literal("lettering"),
    letteringId: id,
    /** Which letter of the words, from 0, spaces counted. */
    letter: z.int().min(0),
    /** Where the setting put the letter's origin, mm about the lettering's own; what differs now was done by hand. */
    laid: z.strictObject({ x: coordinate, y: coordinate, turn: z.number().finite().min(-360).max(360) }),
  }),
  /** A plate that follows the outline of other pieces at a distance. */
  z.strictObject({ kind: z.literal("margin"), margin: length, corners: z.enum(["round", "sharp"]), artworkIds }),
  /** Made of other pieces, which are no longer there. */
  z.strictObject({
    kind: z.literal("worked"),
    how: z.enum(["joined", "cut away", "trimmed", "split"]),
    artworkIds,
  }),
]);
