import type { LimitSet } from "#shared/contracts/limits.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { formatInstant } from "@/lib/format.ts";

type NewerLimitsProps = {
  readonly newer: LimitSet;
  readonly onTake: () => void;
  readonly onKeep: () => void;
};

/** Somebody else saved limits while these were being changed: theirs, or one's own changes on top of theirs. */
export function NewerLimits({ newer: { savedBy, savedAt }, onTake, onKeep }: NewerLimitsProps) {
  return (
    <Notice tone="caution" title="Not saved: the limits were changed meanwhile.">
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
