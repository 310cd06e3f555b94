import type { ComponentProps } from "react";
import { cx } from "@/lib/cx.ts";
import { type ButtonKind, type ButtonSize, buttonClass } from "./button-class.ts";

type ButtonProps = ComponentProps<"button"> & {
  readonly kind?: ButtonKind;
  readonly size?: ButtonSize;
  /** Work is under way: says so, keeps its place in the tab order and takes no second press. */
  readonly busy?: boolean;
};

export function Button({
  kind = "outline",
  size = "normal",
  busy = false,
  className,
  children,
  onClick,
  type = "button",
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={busy ? "button" : type}
      aria-busy={busy || undefined}
      aria-disabled={busy || rest["aria-disabled"]}
      onClick={busy ? undefined : onClick}
      className={cx(buttonClass(kind, size), className)}
    >
      {busy && (
        <svg aria-hidden="true" viewBox="0 0 16 16" className="size-4 motion-safe:animate-spin">
          <circle cx="8" cy="8" r="6" fill="none" stroke="currentColor" strokeWidth="2" strokeDasharray="24 14" />
        </svg>
      )}
      {children}
    </button>
  );
}
