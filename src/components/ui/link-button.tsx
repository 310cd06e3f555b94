import type { ComponentProps } from "react";
import { Link } from "react-router-dom";
import { cx } from "@/lib/cx.ts";
import { type ButtonKind, type ButtonSize, buttonClass } from "./button-class.ts";

type Look = { readonly kind?: ButtonKind; readonly size?: ButtonSize };

/** A link to a page of this application that looks like a button. */
export function LinkButton({
  kind = "outline",
  size = "normal",
  className,
  ...rest
}: ComponentProps<typeof Link> & Look) {
  return <Link {...rest} className={cx(buttonClass(kind, size), className)} />;
}

/** A link to a file or another address that looks like a button. */
export function FileButton({
  kind = "outline",
  size = "normal",
  className,
  children,
  ...rest
}: ComponentProps<"a"> & Look) {
  return (
    <a {...rest} className={cx(buttonClass(kind, size), className)}>
      {children}
    </a>
  );
}
