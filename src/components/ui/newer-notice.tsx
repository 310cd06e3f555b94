import { formatInstant } from "@/lib/format.ts";
import { Button } from "./button.tsx";
import { Notice } from "./notice.tsx";

type NewerNoticeProps = {
  /** What was changed, in the plural: "limits". */
  readonly what: string;
  readonly newer: { readonly savedBy: string | null; readonly savedAt: string | null };
  readonly onTake: () => void;
  readonly onKeep: () => void;
};

/** Somebody else saved while this was being changed: theirs, or one's own changes on top of theirs. */
export function NewerNotice({ what, newer: { savedBy, savedAt }, onTake, onKeep }: NewerNoticeProps) {
  return (
    <Notice tone="caution" title={`Not saved: the ${what} were changed meanwhile.`}>
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
