import { AlertDialog } from "radix-ui";
import type { ReactNode } from "react";
import { Button } from "./button.tsx";
import { Notice } from "./notice.tsx";
import { useReturnFocus } from "./use-return-focus.ts";

type ConfirmDialogProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  /** A question that names the thing: "Withdraw revision B?" */
  readonly title: string;
  /** What happens, and what does not. */
  readonly children: ReactNode;
  /** The verb on the button: "Withdraw B". */
  readonly action: string;
  /** The way out: "Keep it". */
  readonly refuse?: string;
  readonly danger?: boolean;
  readonly busy?: boolean;
  readonly error?: string | null;
  readonly onConfirm: () => void;
};

/** Asks once before an act that cannot be undone. It stays open while the act runs and shows why it failed. */
export function ConfirmDialog({
  open,
  onOpenChange,
  title,
  children,
  action,
  refuse = "Keep it",
  danger = true,
  busy = false,
  error = null,
  onConfirm,
}: ConfirmDialogProps) {
  const focus = useReturnFocus();
  return (
    <AlertDialog.Root open={open} onOpenChange={onOpenChange}>
      <AlertDialog.Portal>
        <AlertDialog.Overlay className="fixed inset-0 z-40 bg-ink/40" />
        <AlertDialog.Content
          {...focus}
          className="fixed top-1/2 left-1/2 z-50 max-h-[calc(100dvh-2rem)] w-[calc(100vw-2rem)] max-w-lg -translate-x-1/2 -translate-y-1/2 overflow-y-auto border border-ink bg-sheet p-5 sm:p-6"
        >
          <AlertDialog.Title className="font-serif text-xl font-bold text-ink">{title}</AlertDialog.Title>
          <AlertDialog.Description asChild>
            <div className="mt-2 space-y-3 text-base text-ink">{children}</div>
          </AlertDialog.Description>
          {error && (
            <Notice tone="error" className="mt-4">
              {error}
            </Notice>
          )}
          <div className="mt-6 flex flex-wrap justify-end gap-3">
            <AlertDialog.Cancel asChild>
              <Button>{refuse}</Button>
            </AlertDialog.Cancel>
            <Button kind={danger ? "danger" : "primary"} busy={busy} onClick={onConfirm}>
              {action}
            </Button>
          </div>
        </AlertDialog.Content>
      </AlertDialog.Portal>
    </AlertDialog.Root>
  );
}
