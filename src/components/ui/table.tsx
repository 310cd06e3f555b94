import { type ComponentProps, type ReactNode, useLayoutEffect, useRef, useState } from "react";
import { cx } from "@/lib/cx.ts";

/** A table as a schedule on a drawing. It scrolls by itself when the window is too narrow. */
export function Table({
  caption,
  captionHidden = true,
  className,
  children,
}: {
  readonly caption: string;
  readonly captionHidden?: boolean;
  readonly className?: string;
  readonly children: ReactNode;
}) {
  const region = useRef<HTMLElement>(null);
  const [scrolls, setScrolls] = useState(false);

  useLayoutEffect(() => {
    const watched = region.current;
    if (!watched) return;
    const observer = new ResizeObserver(() =>
      setScrolls(watched.scrollWidth > watched.clientWidth || watched.scrollHeight > watched.clientHeight),
    );
    observer.observe(watched);
    for (const child of watched.children) observer.observe(child);
    return () => observer.disconnect();
  }, []);

  // What is cut off can then be reached by the arrow keys, too.
  const byKeys = scrolls ? { tabIndex: 0 } : {};
  return (
    <section ref={region} aria-label={caption} {...byKeys} className={cx("relative overflow-x-auto", className)}>
      <table className="w-full border-collapse text-left font-sans text-sm tabular-nums">
        <caption className={captionHidden ? "sr-only" : "pb-2 text-left font-serif text-lg font-bold text-ink"}>
          {caption}
        </caption>
        {children}
      </table>
    </section>
  );
}

export function HeadCell({ className, ...rest }: ComponentProps<"th">) {
  return (
    <th
      scope="col"
      {...rest}
      className={cx("border-b border-graphite bg-linen px-3 py-2 text-fine font-semibold text-graphite", className)}
    />
  );
}

/** The cell that names its row. */
export function RowHead({ className, ...rest }: ComponentProps<"th">) {
  return (
    <th
      scope="row"
      {...rest}
      className={cx("border-b border-rule px-3 py-2.5 align-top font-semibold text-ink", className)}
    />
  );
}

export function Cell({ className, ...rest }: ComponentProps<"td">) {
  return <td {...rest} className={cx("border-b border-rule px-3 py-2.5 align-top text-ink", className)} />;
}
