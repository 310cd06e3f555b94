import { useEffect } from "react";
import { useBlocker } from "react-router-dom";
import { ConfirmDialog } from "./confirm-dialog.tsx";

/** Asks before the page is left while something in it is not saved. One on a page. */
export function UnsavedGuard({ when, what }: { readonly when: boolean /** "The brief" */; readonly what: string }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => when && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    if (!when) return;
    const handleUnload = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", handleUnload);
    return () => window.removeEventListener("beforeunload", handleUnload);
  }, [when]);
  if (blocker.state !== "blocked") return null;
  return (
    <ConfirmDialog
      open
      onOpenChange={() => blocker.reset()}
      title="Leave without saving?"
      action="Leave"
      refuse="Stay here"
      onConfirm={() => blocker.proceed()}
    >
      <p>{what} has changes that are not saved. They are lost when you leave.</p>
    </ConfirmDialog>
  );
}
