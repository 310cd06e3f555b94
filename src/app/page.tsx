import type { ReactNode } from "react";
import { usePageTitle } from "@/lib/page-title.ts";

/** The usual page within a shop: one measure, a heading, room for actions beside it. */
export function Page({
  title,
  heading,
  under,
  actions,
  children,
}: {
  /** For the browser's tab. */
  readonly title: string;
  /** The h1, when it says more than the title. */
  readonly heading?: ReactNode;
  readonly under?: ReactNode;
  readonly actions?: ReactNode;
  readonly children: ReactNode;
}) {
  usePageTitle(title);
  return (
    <div className="mx-auto w-full max-w-7xl px-4 pt-6 pb-16 sm:px-6 lg:px-10">
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="min-w-0">
          <h1 className="font-serif text-2xl font-bold text-ink">{heading ?? title}</h1>
          {under && <div className="mt-1 text-base text-graphite">{under}</div>}
        </div>
        {actions && <div className="flex flex-wrap gap-3">{actions}</div>}
      </div>
      <div className="mt-7">{children}</div>
    </div>
  );
}
