import type { ComponentProps } from "react";
import { Link } from "react-router-dom";
import { cx } from "@/lib/cx.ts";

/** An underlined link within text. */
export function TextLink({ className, ...rest }: ComponentProps<typeof Link>) {
  return <Link {...rest} className={cx("text-indigo underline underline-offset-4 hover:text-ink", className)} />;
}
