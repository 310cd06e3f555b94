import { z } from "zod";
import { AppError } from "../http/app-error.ts";

/** One page of a list and the cursor of the next, null at the end. */
export type Page<T> = { items: T[]; next: string | null };

/** Turns the sort values of the last row into an opaque cursor. */
export function cursorOf(values: readonly (string | number | null)[]): string {
  return Buffer.from(JSON.stringify(values)).toString("base64url");
}

/** What a cursor of each kind of list holds. The bounds are those of the columns they are compared with. */
export const places = {
  instant: z.iso.datetime().refine((text) => text >= "1900"),
  day: z.iso.date().refine((text) => text >= "1900"),
  count: z.int().min(0).max(2_147_483_647),
  id: z.uuid(),
  text: z.string().max(200),
  /** Of a row that the database numbers. */
  bigNumber: z.string().regex(/^\d{1,18}$/),
} as const;

const timePlace = z.tuple([places.instant, places.id]);

/** Reads a cursor back. One that we did not make, or made for another list, is a bad request. */
export function readCursor<T>(cursor: string | undefined, place: z.ZodType<T>): T | null {
  if (cursor === undefined) return null;
  const outcome = place.safeParse(parsed(cursor));
  if (!outcome.success)
    throw new AppError("malformed_request", {
      detail: "This place in the list is not known. Start at its beginning.",
    });
  return outcome.data;
}

/** Reads the cursor of a list ordered by time and id back. */
export function readTimeCursor(cursor: string | undefined): { at: string; id: string } | null {
  const values = readCursor(cursor, timePlace);
  return values && { at: values[0], id: values[1] };
}

function parsed(cursor: string): unknown {
  try {
    return JSON.parse(Buffer.from(cursor, "base64url").toString("utf8"));
  } catch {
    return null;
  }
}

/** Cuts `limit + 1` rows to a page: the row too many says that there is more. */
export function pageOf<R, T>(
  rows: readonly R[],
  limit: number,
  present: (row: R) => T,
  place: (row: R) => (string | number | null)[],
): Page<T> {
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  return { items: shown.map(present), next: rows.length > limit && last !== undefined ? cursorOf(place(last)) : null };
}
