import { SkeletonBar, useSlow } from "@/components/ui/skeleton.tsx";

/** The sheet's frame while its drawing is on the way. */
export function SheetSkeleton() {
  const slow = useSlow(true);
  return (
    <div role="status" className="min-h-[60dvh] px-4 py-6 sm:px-6">
      {slow && (
        <>
          <span className="sr-only">Loading the sheet</span>
          <SkeletonBar className="h-7 w-72 max-w-full" />
          <div className="mt-5 grid gap-4 border border-ink bg-sheet p-5 lg:grid-cols-[minmax(0,1fr)_23.5rem]">
            <SkeletonBar className="h-[50dvh]" />
            <div className="space-y-4">
              <SkeletonBar className="h-16" />
              <SkeletonBar className="h-16" />
              <SkeletonBar className="h-16" />
              <SkeletonBar className="h-32" />
            </div>
          </div>
        </>
      )}
    </div>
  );
}
