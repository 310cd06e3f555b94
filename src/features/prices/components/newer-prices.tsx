import type { Prices } from "#shared/contracts/prices.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { formatInstant } from "@/lib/format.ts";

type NewerPricesProps = {
  readonly newer: Prices;
  readonly onTake: () => void;
  readonly onKeep: () => void;
};

/** Somebody else saved prices while these were being changed: theirs, or one's own changes on top of theirs. */
export function NewerPrices({ newer: { savedBy, savedAt }, onTake, onKeep }: NewerPricesProps) {
  return (
    <Notice tone="caution" title="Not saved: the prices were changed meanwhile.">
      <p>
        {savedBy ?? "Someone"} saved others{savedAt ? `, ${formatInstant(savedAt)}` : ""}. Your changes are still here.
      </p>
      <div className="mt-2 flex flex-wrap gap-3">
        <Button size="small" onClick={onKeep}>
          Lay my changes over theirs
        </Button>
        <Button size="small" onClick={onTake}>
          Take theirs
        </Button>
      </div>
    </Notice>
  );
}
