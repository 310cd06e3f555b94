import { useState } from "react";
import type { Mockup } from "#shared/contracts/mockups.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { counted, formatInstant } from "@/lib/format.ts";
import type { KeptDraft } from "../editor/draft-shelf.ts";
import { ChangeList } from "./change-list.tsx";

type KeptDraftNoticeProps = {
  readonly draft: KeptDraft;
  /** What the server has. */
  readonly mockup: Mockup;
  readonly unit: LengthUnit;
  readonly onTakeUp: () => void;
  readonly onThrowAway: () => void;
};

/** Work that never reached the server, found on this device when the mockup is opened again. */
export function KeptDraftNotice({ draft, mockup, unit, onTakeUp, onThrowAway }: KeptDraftNoticeProps) {
  const [asking, setAsking] = useState(false);
  const when = formatInstant(draft.keptAt);
  return (
    <Notice tone="caution" title={`Work from ${when} was kept on this device and never saved.`}>
      <div className="space-y-2">
        <p className="text-sm">
          {changesWords(draft)} {baseWords(draft, mockup)} Undo brings back what you see now.
        </p>
        <ChangeList
          before={mockup.document}
          after={draft.document}
          unit={unit}
          title="Taken up, it changes what the server has"
        />
        <div className="flex flex-wrap gap-3">
          <Button size="small" onClick={onTakeUp}>
            Take it up
          </Button>
          <Button size="small" onClick={() => setAsking(true)}>
            Throw it away
          </Button>
        </div>
      </div>
      <ConfirmDialog
        open={asking}
        onOpenChange={setAsking}
        title={`Throw away the work from ${when}?`}
        action="Throw it away"
        onConfirm={() => {
          setAsking(false);
          onThrowAway();
        }}
      >
        <p>It is on this device only, and nothing brings it back.</p>
      </ConfirmDialog>
    </Notice>
  );
}

function changesWords({ changes, lastChange }: KeptDraft): string {
  const count = counted(Math.max(1, changes), "change");
  return lastChange === null ? `It is ${count}.` : `It is ${count}, the last of them “${lastChange}”.`;
}

function baseWords({ version }: KeptDraft, mockup: Mockup): string {
  if (version === mockup.version)
    return version === 0
      ? "It began from the empty board; taken up, it is saved."
      : `It began from version ${version}, which is the one you see; taken up, it is saved.`;
  const saver = mockup.savedBy ?? "Someone";
  const at = mockup.savedAt === null ? "" : ` ${formatInstant(mockup.savedAt)}`;
  return `It began from version ${version}; ${saver} saved version ${mockup.version}${at}. Taken up, it is saved over that one.`;
}
