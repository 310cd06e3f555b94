import { z } from "zod";

/** Largest sign, piece or offset we take, mm. Beyond it figures mean nothing and the canvas can't show them. */
export const longestMm = 10_000;

/** Least side of a board, mm: figures and shadows of a smaller one have no meaning. */
export const leastBoardMm = 20;

export const length = z.number().finite().positive().max(longestMm);
export const coordinate = z.number().finite().min(-longestMm).max(longestMm);
/** Controls and halves of surrogate pairs: nothing draws them, and the database takes them in no record. */
const unwritable = /[\p{Cc}\p{Cs}]/u;
export const idOf = (longest: number) =>
  z
    .string()
    .min(1)
    .max(longest)
    .refine((text) => !unwritable.test(text), "An id has no control characters.");
export const id = idOf(64);
/** One line of text that may be empty. Of what is pasted into it, what can't be written becomes spaces. */
export const line = z
  .string()
  .overwrite((text) => text.replace(/[\p{Cc}\p{Cs}]+/gu, " "))
  .trim()
  .max(120);
export const name = line.min(1);
export const colour = z.string().regex(/^#[0-9A-F]{6}$/, "A colour is # and six hexadecimal digits in capitals.");
export const stockId = z.uuid().nullable();

export const point = z.strictObject({ x: coordinate, y: coordinate });

const segment = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("line"), to: point }),
  z.strictObject({ kind: z.literal("cubic"), c1: point, c2: point, to: point }),
]);
const ring = z.strictObject({ start: point, segments: z.array(segment).min(1).max(100_000) });
export const pathSchema = z.array(ring).max(10_000);
