import { z } from "zod";
import { AppError } from "../http/app-error.ts";

/** One page of a list and the cursor of the next, null at the end. */
export type Page<T> = { items: T[]; next: string | null };

/** Turns the sort values of the last row into an opaque cursor. */
export function cursorOf(values: readonly (string | number | null)[]): string {
  return Buffer.from(JSON.stringify(values)).toString("base64url");
}

/** Reads a cursor of `length` values back. A cursor we did not make is a bad request. */
export function readCursor(cursor: string | undefined, length: number): (string | number | null)[] | null {
  if (cursor === undefined) return null;
  const values = parsed(cursor);
  const plain =
    Array.isArray(values) &&
    values.every((value) => value === null || typeof value === "string" || typeof value === "number");
  if (!plain || values.length !== length) throw unknownPlace();
  return values;
}

const unknownPlace = (): AppError =>
  new AppError("malformed_request", { detail: "This place in the list is not known. Start at its beginning." });

/** Reads the cursor of a list ordered by time and id back. */
export function readTimeCursor(cursor: string | undefined): { at: string; id: string } | null {
  const values = readCursor(cursor, 2);
  if (values === null) return null;
  const outcome = timePlace.safeParse({ at: values[0], id: values[1] });
  if (!outcome.success) throw unknownPlace();
  return outcome.data;
}

const timePlace = z.object({ at: z.iso.datetime(), id: z.uuid() });

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
