import type { ReactNode } from "react";
import { cx } from "@/lib/cx.ts";
import { useDropsKeptOut } from "@/lib/use-drops-kept-out.ts";
import { useFileDrop } from "@/lib/use-file-drop.ts";

type DropGroundProps = {
  readonly className?: string;
  readonly onFiles: (files: readonly File[]) => void;
  readonly children: ReactNode;
};

/** The drawing as a ground that artwork files can be dropped on. Files dropped beside it do nothing, instead of leaving the page. */
export function DropGround({ className, onFiles, children }: DropGroundProps) {
  const { over, handlers } = useFileDrop(onFiles);
  useDropsKeptOut();
  return (
    <section aria-label="Drawing" data-desk-part {...handlers} className={cx("relative", className)}>
      {children}
      {over && (
        <p className="pointer-events-none absolute inset-2 z-20 flex items-center justify-center border-2 border-dashed border-indigo bg-sheet/80 text-base font-semibold text-indigo">
          Drop it to bring it in as artwork
        </p>
      )}
    </section>
  );
}
