import { useEffect } from "react";

/**
 * Ctrl Z and Ctrl Shift Z (or Y), with the Command key on a Mac, wherever the focus is but in a field that is being typed
 * in, where they are the field's own. A cell that nothing was typed in since it was taken says so by data-untouched. `step` must stay the same function, as a reducer's dispatch does.
 */
export function useUndoKeys(step: (action: { readonly kind: "undo" | "redo" }) => void): void {
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || isField(event.target)) return;
      const key = event.key.toLowerCase();
      if (key !== "z" && key !== "y") return;
      event.preventDefault();
      step({ kind: key === "y" || event.shiftKey ? "redo" : "undo" });
    };
    window.addEventListener("keydown", listen);
    return () => window.removeEventListener("keydown", listen);
  }, [step]);
}

function isField(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    target.closest("input:not([type=radio], [data-untouched]), textarea, [role=dialog]:not([data-undoes])") !== null
  );
}
