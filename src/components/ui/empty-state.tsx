import type { ReactNode } from "react";

/** Stands where a list would, and says what to do first. */
export function EmptyState({
  title,
  children,
  action,
}: {
  readonly title: string;
  readonly children?: ReactNode;
  readonly action?: ReactNode;
}) {
  return (
    <div className="border border-dashed border-graphite px-5 py-8">
      <p className="font-serif text-lg font-bold text-ink">{title}</p>
      {children && <div className="mt-1 max-w-prose text-base text-graphite">{children}</div>}
      {action && <div className="mt-4">{action}</div>}
    </div>
  );
}
