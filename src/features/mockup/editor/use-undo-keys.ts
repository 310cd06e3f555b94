import { useEffect } from "react";

/** Ctrl Z and Ctrl Shift Z (or Y), with the Command key on a Mac, wherever the focus is but in a field: there they are the field's own. */
export function useUndoKeys(undo: () => void, redo: () => void): void {
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || isField(event.target)) return;
      const key = event.key.toLowerCase();
      const isRedo = key === "y" || (key === "z" && event.shiftKey);
      if (!isRedo && key !== "z") return;
      event.preventDefault();
      if (isRedo) redo();
      else undo();
    };
    window.addEventListener("keydown", listen);
    return () => window.removeEventListener("keydown", listen);
  }, [undo, redo]);
}

function isField(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && target.closest("input:not([type=radio]), textarea, [role=dialog]") !== null;
}
