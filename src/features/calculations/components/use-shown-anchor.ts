import { useEffect } from "react";
import { useLocation } from "react-router-dom";

/**
 * Brings the part that the address names into view and gives it the focus, also when the page came later than the
 * address or the same link is pressed again. Gives back the part's id, or null.
 */
export function useShownAnchor(): string | null {
  const { hash, key } = useLocation();
  const id = hash === "" ? null : decodeURIComponent(hash.slice(1));
  // The key changes when the same place is asked for again.
  useEffect(() => {
    const part = id === null || key === "" ? null : document.getElementById(id);
    part?.scrollIntoView();
    part?.focus({ preventScroll: true });
  }, [id, key]);
  return id;
}
