import { type FormEvent, useState } from "react";
import type { FieldValues, Path, UseFormReturn } from "react-hook-form";
import { landProblem } from "./form-problem.ts";

/**
 * Sends a form's checked values. Refusals land on their fields; `problem` says what concerns the form as a whole.
 * `fields` are those the form shows.
 */
export function useSend<Input extends FieldValues, Output>(
  form: UseFormReturn<Input, unknown, Output>,
  fields: readonly Path<Input>[],
  send: (values: Output) => Promise<unknown>,
) {
  const [problem, setProblem] = useState<string | null>(null);
  const submit = form.handleSubmit(async (values) => {
    setProblem(null);
    try {
      await send(values);
    } catch (error) {
      setProblem(landProblem(error, form.setError, fields));
    }
  });
  return {
    problem,
    busy: form.formState.isSubmitting,
    handleSubmit: (event: FormEvent<HTMLFormElement>) => {
      // A dialog's form may lie within another form of the component tree.
      event.stopPropagation();
      void submit(event);
    },
  };
}
