import type { ComponentProps } from "react";
import { cx } from "@/lib/cx.ts";
import { controlClass, FieldFrame, type FieldFrameProps } from "./field-frame.tsx";

type SelectProps = Omit<ComponentProps<"select">, "className" | "id"> & FieldFrameProps;

/** One choice out of a few, the platform's own so that it works under every thumb. Options are the children. */
export function Select({ label, hint, error, className, labelHidden = false, children, ...select }: SelectProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} labelHidden={labelHidden} {...(className ? { className } : {})}>
      {(ties) => (
        <span className="relative block">
          <select {...select} {...ties} className={cx(controlClass, "cursor-pointer appearance-none pr-9")}>
            {children}
          </select>
          <svg
            aria-hidden="true"
            viewBox="0 0 16 16"
            className="pointer-events-none absolute top-1/2 right-3 size-3.5 -translate-y-1/2 text-graphite"
          >
            <path d="M2 5l6 6 6-6" fill="none" stroke="currentColor" strokeWidth="2" />
          </svg>
        </span>
      )}
    </FieldFrame>
  );
}
