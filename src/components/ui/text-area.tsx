import type { ComponentProps } from "react";
import { controlClass, FieldFrame, type FieldFrameProps } from "./field-frame.tsx";

type TextAreaProps = Omit<ComponentProps<"textarea">, "className" | "id"> & FieldFrameProps;

/** Several lines of text with label, hint and error. */
export function TextArea({ label, hint, error, className, labelHidden = false, rows = 3, ...area }: TextAreaProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} labelHidden={labelHidden} {...(className ? { className } : {})}>
      {(ties) => <textarea {...area} {...ties} rows={rows} className={controlClass} />}
    </FieldFrame>
  );
}
