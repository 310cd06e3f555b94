import type { ComponentProps, ReactNode } from "react";
import { cx } from "@/lib/cx.ts";
import { controlClass, FieldFrame, type FieldFrameProps, typedClass } from "./field-frame.tsx";

type FieldProps = Omit<ComponentProps<"input">, "className" | "id"> &
  FieldFrameProps & {
    /** A unit or a word after the control, as "mm". */
    readonly suffix?: ReactNode;
  };

/** One line of text with its label, hint and error. */
export function Field({ label, hint, error, className, labelHidden = false, suffix, ...input }: FieldProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} labelHidden={labelHidden} {...(className ? { className } : {})}>
      {(ties) =>
        suffix ? (
          <span className="flex items-center gap-2">
            <input {...input} {...ties} className={cx(controlClass, typedClass, "tabular-nums")} />
            <span className="text-sm text-graphite">{suffix}</span>
          </span>
        ) : (
          <input {...input} {...ties} className={cx(controlClass, typedClass)} />
        )
      }
    </FieldFrame>
  );
}
