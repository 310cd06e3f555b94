import type { FieldValues, Path, UseFormSetError } from "react-hook-form";
import { ApiProblem } from "./api-client.ts";

/** What to tell the reader about anything thrown. */
export const messageOf = (error: unknown): string =>
  error instanceof ApiProblem ? error.message : "Something went wrong on this page. Nothing was sent. Try again.";

/** A JSON pointer as the form's own field name: /brief/widthMm is brief.widthMm. */
export const fieldOfPointer = (pointer: string): string =>
  pointer
    .split("/")
    .slice(1)
    .map((part) => part.replaceAll("~1", "/").replaceAll("~0", "~"))
    .join(".");

/**
 * Puts each refused field's reason under that field and gives the sentence for the form as a whole.
 * A reason whose field the form does not show is added to that sentence, so that nothing is lost.
 */
export function landProblem<T extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<T>,
  fields: readonly Path<T>[],
): string {
  const refused = error instanceof ApiProblem ? (error.problem?.errors ?? []) : [];
  const unplaced: string[] = [];
  for (const { pointer, detail } of refused) {
    const field = fields.find((name) => name === fieldOfPointer(pointer));
    if (field === undefined) unplaced.push(detail);
    else setError(field, { type: "server", message: detail }, { shouldFocus: unplaced.length === 0 });
  }
  return [messageOf(error), ...unplaced].join(" ");
}
