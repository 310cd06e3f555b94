import { useRef } from "react";

/**
 * Gives the focus back to whatever had it when a dialog opened, or to the page's main part when that is gone.
 * The dialogs here are opened by state and have no trigger of their own that could be asked.
 */
export function useReturnFocus() {
  const opener = useRef<HTMLElement | null>(null);
  return {
    onOpenAutoFocus: () => {
      opener.current = document.activeElement instanceof HTMLElement ? document.activeElement : null;
    },
    onCloseAutoFocus: (event: Event) => {
      event.preventDefault();
      const back = opener.current?.isConnected ? opener.current : document.querySelector("main");
      back?.focus({ preventScroll: true });
    },
  };
}
