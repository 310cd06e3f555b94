import type { ComponentProps } from "react";
import { cx } from "@/lib/cx.ts";

/** Cells of a table that is worked in: one line high, so that the whole schedule stays in view. */
export function DeskHead({ className, ...rest }: ComponentProps<"th">) {
  return (
    <th
      scope="col"
      {...rest}
      className={cx(
        "border-b border-graphite bg-linen px-2 py-1 text-fine font-semibold whitespace-nowrap text-graphite",
        className,
      )}
    />
  );
}

/** The cell that names its row. */
export function DeskRowHead({ className, ...rest }: ComponentProps<"th">) {
  return (
    <th
      scope="row"
      {...rest}
      className={cx("border-b border-rule px-2 py-0.5 font-semibold whitespace-nowrap text-ink", className)}
    />
  );
}

export function DeskCell({ className, ...rest }: ComponentProps<"td">) {
  return <td {...rest} className={cx("border-b border-rule px-2 py-0.5 whitespace-nowrap text-ink", className)} />;
}
