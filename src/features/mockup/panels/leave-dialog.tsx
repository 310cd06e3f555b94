import { useBlocker } from "react-router-dom";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import type { Saving } from "../editor/use-autosave.ts";
import type { KeepFailure } from "../editor/use-draft-keeper.ts";

/** Asks before the mockup is left with work that can't be saved now. What can be saved is saved on the way out. */
export function LeaveDialog({ saving, keepFailure }: { readonly saving: Saving; readonly keepFailure: KeepFailure }) {
  const { state } = saving.autosave;
  const stuck = state === "offline" || state === "refused" || state === "stale";
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => stuck && currentLocation.pathname !== nextLocation.pathname,
  );
  return (
    <ConfirmDialog
      open={blocker.state === "blocked"}
      onOpenChange={() => blocker.reset?.()}
      title="Leave with unsaved work?"
      action="Leave"
      refuse="Stay"
      onConfirm={() => blocker.proceed?.()}
    >
      <p>
        {keepFailure === null
          ? "The last changes are not on the server. They are kept on this device and offered when you open the mockup here again."
          : "The last changes are not on the server, and this device keeps no copy of them. They are lost when you leave."}
      </p>
    </ConfirmDialog>
  );
}
