import { AlertDialog } from "radix-ui";
import type { Mockup } from "#shared/contracts/mockups.ts";
import { Button } from "@/components/ui/button.tsx";
import { formatInstant } from "@/lib/format.ts";

type StaleDialogProps = { readonly newer: Mockup | null; readonly onTheirs: () => void; readonly onMine: () => void };

/** Two people saved one mockup: asks which of the two is to go on. It can't be passed over, since nothing is saved until then. */
export function StaleDialog({ newer, onTheirs, onMine }: StaleDialogProps) {
  return (
    <AlertDialog.Root open={newer !== null}>
      <AlertDialog.Portal>
        <AlertDialog.Overlay className="fixed inset-0 z-40 bg-ink/40" />
        <AlertDialog.Content className="fixed top-1/2 left-1/2 z-50 w-[calc(100vw-2rem)] max-w-lg -translate-x-1/2 -translate-y-1/2 border border-ink bg-sheet p-5 sm:p-6">
          <AlertDialog.Title className="font-serif text-xl font-bold text-ink">
            Someone saved a newer version
          </AlertDialog.Title>
          <AlertDialog.Description className="mt-2 text-base text-ink">
            {newer?.savedBy ?? "Someone else"} saved this mockup
            {newer?.savedAt ? ` ${formatInstant(newer.savedAt)}` : ""}, after you began. Keep theirs: your changes leave
            the desk, and Undo brings them back. Keep mine: yours is saved over theirs.
          </AlertDialog.Description>
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
