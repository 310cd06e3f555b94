import { z } from "zod";
import { coordinate, id, length } from "./schema-parts.ts";

/** Longest words set as one: more than a sign bears. */
export const longestWords = 500;

/** Words as they were typed and how they are set: from these, and the face, the letters' outlines come again. Lengths mm. */
export const letteringSchema = z.strictObject({
  id,
  /** Lines are parted by a line feed; other controls become spaces. */
  words: z
    .string()
    .overwrite((text) => text.replace(/\r\n?/g, "\n").replace(/[^\P{Cc}\n]|\p{Cs}/gu, " "))
    .max(longestWords)
    .refine((text) => text.trim() !== "", "Lettering has at least one letter."),
  /** Key of the face among shared/lettering, and the hash of the file its outlines were taken from. */
  face: z.string().regex(/^[a-z][a-z0-9-]{0,59}$/, "A face's key is small letters, digits and hyphens."),
  fontSha256: z.string().regex(/^[0-9a-f]{64}$/, "A SHA-256 is 64 hexadecimal digits."),
  /** Height of a flat capital as H over the line it stands on. */
  capHeight: length.max(5000),
  /** Added between letters. */
  letterSpacing: z.number().finite().min(-500).max(2000),
  /** Whether pairs of letters are drawn together or apart as the face says. */
  kerning: z.boolean(),
  /** From one line to the next; along an arc, between radii. */
  lineSpacing: length,
  align: z.enum(["left", "centre", "right"]),
  along: z.discriminatedUnion("kind", [
    z.strictObject({ kind: z.literal("line") }),
    /** The letters' feet stand on the arc: over it, as on a crown, or hanging under it, as in a bowl. */
    z.strictObject({ kind: z.literal("arc"), radius: coordinate.positive(), side: z.enum(["over", "under"]) }),
  ]),
});
