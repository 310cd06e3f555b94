import type { ReactNode } from "react";

/** A numbered part of the plan under its heading. */
export function Part({
  id,
  title,
  children,
}: {
  readonly id: string;
  readonly title: string;
  readonly children: ReactNode;
}) {
  return (
    <section aria-labelledby={id} className="mt-12">
      <h2
        id={id}
        tabIndex={-1}
        className="scroll-mt-4 border-b-2 border-ink pb-2 font-serif text-xl font-bold text-ink break-after-avoid"
      >
        {title}
      </h2>
      {children}
    </section>
  );
}
