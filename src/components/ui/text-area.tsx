import type { ComponentProps } from "react";
import { cx } from "@/lib/cx.ts";
import { controlClass, FieldFrame, type FieldFrameProps, typedClass } from "./field-frame.tsx";

type TextAreaProps = Omit<ComponentProps<"textarea">, "className" | "id"> & FieldFrameProps;

/** Several lines of text with label, hint and error. */
export function TextArea({ label, hint, error, className, labelHidden = false, rows = 3, ...area }: TextAreaProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} labelHidden={labelHidden} {...(className ? { className } : {})}>
      {(ties) => <textarea {...area} {...ties} rows={rows} className={cx(controlClass, typedClass)} />}
    </FieldFrame>
  );
}
