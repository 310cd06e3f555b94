import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { formatInstant } from "@/lib/format.ts";
import type { KeptDraft } from "../editor/kept-draft.ts";

type KeptDraftNoticeProps = {
  readonly draft: KeptDraft;
  /** The version on the server now. */
  readonly version: number;
  readonly onTakeUp: () => void;
  readonly onLeave: () => void;
};

/** Work that never reached the server, found on this device when the mockup is opened again. */
export function KeptDraftNotice({ draft, version, onTakeUp, onLeave }: KeptDraftNoticeProps) {
  return (
    <Notice tone="caution" title={`Work from ${formatInstant(draft.keptAt)} was kept on this device and never saved.`}>
      <p className="text-sm">
        {draft.version === version
          ? "Take it up and it is saved now; Undo brings back what you see."
          : "A newer version was saved since. Take it up and it is saved over that one; Undo brings back what you see."}
      </p>
      <div className="mt-2 flex flex-wrap gap-3">
        <Button size="small" onClick={onTakeUp}>
          Take it up
        </Button>
        <Button size="small" onClick={onLeave}>
          Throw it away
        </Button>
      </div>
    </Notice>
  );
}
