import { useEffect } from "react";

/** What is a part says so by data-desk-part; the head of the page is the first of them. */
const partsOfDesk = "header, [data-desk-part]";

/**
 * F6 brings the focus to the next part of the desk, Shift F6 back, so that a long list is no long way: the key that the
 * ARIA Authoring Practices (W3C, window splitter) name for going from pane to pane. In a dialog or a menu it does nothing.
 */
export function usePartKeys(): void {
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (event.key !== "F6" || event.ctrlKey || event.metaKey || event.altKey || isCovered(event.target)) return;
      const part = partFrom(document.activeElement ?? document.body, event.shiftKey ? "back" : "on");
      if (!part) return;
      event.preventDefault();
      focusOn(part);
    };
    window.addEventListener("keydown", listen);
    return () => window.removeEventListener("keydown", listen);
  }, []);
}

const isCovered = (target: EventTarget | null): boolean =>
  target instanceof Element && target.closest("[role=dialog], [role=alertdialog], [role=menu]") !== null;

/** The part after or before the one that the focus is in or has passed; round again at the end. */
function partFrom(focus: Element, way: "on" | "back"): HTMLElement | undefined {
  const parts = [...document.querySelectorAll<HTMLElement>(partsOfDesk)];
  const here = parts.findLastIndex(
    (part) => part.contains(focus) || (focus.compareDocumentPosition(part) & Node.DOCUMENT_POSITION_PRECEDING) !== 0,
  );
  if (way === "on") return parts[(here + 1) % parts.length];
  return parts.at(parts[here]?.contains(focus) ? here - 1 : here);
}

function focusOn(part: HTMLElement): void {
  // Only for this key: a press of the mouse on its bare ground is not to bring the focus there.
  part.tabIndex = -1;
  part.addEventListener("blur", () => part.removeAttribute("tabindex"), { once: true });
  part.focus();
}
