import { type ReactNode, useId } from "react";
import { cx } from "@/lib/cx.ts";

/** What ties a control to its label, hint and error. */
export type ControlTies = {
  readonly id: string;
  readonly "aria-describedby": string | undefined;
  readonly "aria-invalid": true | undefined;
};

export type FieldFrameProps = {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  readonly error?: string | undefined;
  readonly className?: string;
  /** The label is for screen readers only, as in a table whose head names the column. */
  readonly labelHidden?: boolean;
};

/** A label above, a hint and an error below, tied to the control that `children` draws. */
export function FieldFrame({
  label,
  hint,
  error,
  className,
  labelHidden = false,
  children,
}: FieldFrameProps & { readonly children: (ties: ControlTies) => ReactNode }) {
  const id = useId();
  const hintId = hint ? `${id}-hint` : undefined;
  const errorId = error ? `${id}-error` : undefined;
  return (
    <div className={cx("flex min-w-0 flex-col gap-1", className)}>
      <label htmlFor={id} className={labelHidden ? "sr-only" : "font-sans text-sm font-semibold text-ink"}>
        {label}
      </label>
      {children({
        id,
        "aria-describedby": [hintId, errorId].filter(Boolean).join(" ") || undefined,
        "aria-invalid": error ? true : undefined,
      })}
      {hint && (
        <p id={hintId} className="text-fine text-graphite">
          {hint}
        </p>
      )}
      {error && (
        <p id={errorId} className="flex gap-1.5 text-sm text-oxblood">
          <svg aria-hidden="true" viewBox="0 0 16 16" className="mt-1 size-3.5 shrink-0">
            <path d="M3 3l10 10M13 3L3 13" stroke="currentColor" strokeWidth="2" fill="none" />
          </svg>
          {error}
        </p>
      )}
    </div>
  );
}

/** For typed controls; a browser counts every select as read-only. */
export const typedClass = "read-only:bg-linen";

export const controlClass =
  "min-h-11 w-full min-w-0 rounded border border-graphite bg-sheet px-3 py-2 text-base text-ink placeholder:text-graphite aria-invalid:border-oxblood aria-invalid:border-2 disabled:border-rule disabled:bg-linen disabled:text-graphite";
