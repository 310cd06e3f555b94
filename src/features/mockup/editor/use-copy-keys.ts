import { useEffect, useEffectEvent } from "react";

type CopyKeys = {
  /** Whether there are pieces to copy, take out or double. */
  readonly hasChosen: boolean;
  readonly onCopy: () => void;
  readonly onTakeOut: () => void;
  readonly onDouble: () => void;
  readonly onPaste: () => void;
  readonly onPasteAsLayers: () => void;
};

/**
 * Ctrl C, X, D and V, with the Command key on a Mac, wherever the focus is but in a field or a dialog, which have a copy
 * and paste of their own; words that are marked on the page are copied as words.
 */
export function useCopyKeys({ hasChosen, onCopy, onTakeOut, onDouble, onPaste, onPasteAsLayers }: CopyKeys): void {
  const does = useEffectEvent((key: string, shift: boolean): (() => void) | null => {
    if (key === "v") return shift ? onPasteAsLayers : onPaste;
    if (!hasChosen || shift) return null;
    if (key === "d") return onDouble;
    if (hasMarkedWords()) return null;
    return key === "c" ? onCopy : key === "x" ? onTakeOut : null;
  });
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || hasOwnKeys(event.target)) return;
      const what = does(event.key.toLowerCase(), event.shiftKey);
      if (what === null) return;
      event.preventDefault();
      what();
    };
    window.addEventListener("keydown", listen);
    return () => window.removeEventListener("keydown", listen);
  }, []);
}

const hasMarkedWords = (): boolean => (window.getSelection()?.toString() ?? "") !== "";

function hasOwnKeys(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    target.closest("input:not([type=radio], [type=checkbox]), textarea, select, [role=dialog], [role=menu]") !== null
  );
}
