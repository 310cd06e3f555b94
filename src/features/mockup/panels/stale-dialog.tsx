import { AlertDialog } from "radix-ui";
import type { Mockup } from "#shared/contracts/mockups.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { formatInstant } from "@/lib/format.ts";
import { ChangeList } from "./change-list.tsx";

type StaleDialogProps = {
  readonly newer: Mockup | null;
  /** What is on the desk. */
  readonly mine: MockupDocument;
  readonly unit: LengthUnit;
  readonly onTheirs: () => void;
  readonly onMine: () => void;
};

/** Two people saved one mockup: asks which of the two is to go on. It can't be passed over, since nothing is saved until then. */
export function StaleDialog({ newer, mine, unit, onTheirs, onMine }: StaleDialogProps) {
  return (
    <AlertDialog.Root open={newer !== null}>
      <AlertDialog.Portal>
        <AlertDialog.Overlay className="fixed inset-0 z-40 bg-ink/40" />
        <AlertDialog.Content className="fixed top-1/2 left-1/2 z-50 max-h-[calc(100dvh-2rem)] w-[calc(100vw-2rem)] max-w-lg -translate-x-1/2 -translate-y-1/2 overflow-y-auto border border-ink bg-sheet p-5 sm:p-6">
          <AlertDialog.Title className="font-serif text-xl font-bold text-ink">
            Someone saved a newer version
          </AlertDialog.Title>
          <AlertDialog.Description className="mt-2 text-base text-ink">
            {newer?.savedBy ?? "Someone else"} saved version {newer?.version} of this mockup
            {newer?.savedAt ? ` ${formatInstant(newer.savedAt)}` : ""}, after you began. Whichever you keep, Undo brings
            the other one back as long as you stay.
          </AlertDialog.Description>
          {newer && (
            <div className="mt-3">
              <ChangeList
                before={mine}
                after={newer.document}
                unit={unit}
                title="What theirs has that yours has otherwise"
              />
            </div>
          )}
          <div className="mt-6 flex flex-wrap justify-end gap-3">
            <AlertDialog.Cancel asChild>
              <Button onClick={onTheirs}>Keep theirs</Button>
            </AlertDialog.Cancel>
            <AlertDialog.Action asChild>
              <Button kind="danger" onClick={onMine}>
                Keep mine
              </Button>
            </AlertDialog.Action>
          </div>
        </AlertDialog.Content>
      </AlertDialog.Portal>
    </AlertDialog.Root>
  );
}
