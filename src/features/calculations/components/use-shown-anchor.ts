import { useEffect, useEffectEvent } from "react";
import { useLocation } from "react-router-dom";
import type { ExamplesState } from "../engine/use-worked-examples.ts";

/**
 * Brings the part that the address names into view and gives it the focus, also when the page came later than the
 * address or the same link is pressed again. Examples that come in above push it away: then it is brought back, unless
 * the reader has gone on. Gives back the part's id, or "" for none.
 */
export function useShownAnchor(step: ExamplesState["step"]): string {
  const location = useLocation();
  const id = idOf(location);
  const bringBack = useEffectEvent(() => {
    const part = document.getElementById(id);
    if (part === document.activeElement) part?.scrollIntoView();
  });

  useEffect(() => {
    const part = document.getElementById(idOf(location));
    part?.scrollIntoView();
    part?.focus({ preventScroll: true });
  }, [location]);
  useEffect(() => {
    if (step === "computed") bringBack();
  }, [step]);
  return id;
}

const idOf = ({ hash }: { readonly hash: string }): string => hash.slice(1);
