import { useEffect, useState } from "react";
import { cx } from "@/lib/cx.ts";

/** True once `waiting` has lasted 300 ms, so that quick answers do not flash. */
export function useSlow(waiting: boolean): boolean {
  const [slow, setSlow] = useState(false);
  useEffect(() => {
    if (!waiting) {
      setSlow(false);
      return;
    }
    const timer = window.setTimeout(() => setSlow(true), 300);
    return () => window.clearTimeout(timer);
  }, [waiting]);
  return slow;
}

/** One bar in the place of a line to come. Give it the width and height of what it stands for. */
export function SkeletonBar({ className }: { readonly className?: string }) {
  return <span aria-hidden="true" className={cx("block h-4 bg-linen motion-safe:animate-pulse", className)} />;
}

/** Rows in the place of a list to come; nothing at all for the first 300 ms. */
export function Skeleton({
  label,
  rows = 4,
  rowClassName = "h-12",
}: {
  readonly label: string;
  readonly rows?: number;
  readonly rowClassName?: string;
}) {
  const slow = useSlow(true);
  return (
    <div role="status" className="min-h-12">
      {slow && (
        <>
          <span className="sr-only">{label}</span>
          <div className="space-y-3">
            {Array.from({ length: rows }, (_, index) => `row ${index}`).map((key) => (
              <SkeletonBar key={key} className={rowClassName} />
            ))}
          </div>
        </>
      )}
    </div>
  );
}
