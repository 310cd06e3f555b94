import { useEffect, useState } from "react";
import { isMissingPart } from "@/lib/missing-part.ts";

const lastAt = "standproud:loaded again";
/** A page that breaks again so soon after it was loaded again is not helped by that, ms. */
const soonMs = 60_000;

/** Whether this tab may be loaded again by itself now; if so, that counts as done. Never where the browser refuses the tab's store. */
function takeTurn(): boolean {
  try {
    const last = window.sessionStorage.getItem(lastAt);
    if (last !== null && Date.now() - Number(last) < soonMs) return false;
    window.sessionStorage.setItem(lastAt, String(Date.now()));
    return true;
  } catch {
    return false;
  }
}

const isServerThere = (): Promise<boolean> =>
  fetch("/api/ready").then(
    ({ ok }) => ok,
    () => false,
  );

const loadAgain = () => window.location.reload();

/**
 * Loads the page again when a part of it can't be fetched although the server is there: since it was opened, a newer version took the
 * server's place. Says whether that is under way. What is being typed is kept over it.
 */
export function useLoadAgain(error: unknown, reload: () => void = loadAgain): boolean {
  const [isUnderWay, setUnderWay] = useState(() => isMissingPart(error));
  useEffect(() => {
    if (!isUnderWay) return;
    // Not while drawing: after an error the screen is drawn twice, and the turn is taken once.
    if (!takeTurn()) return setUnderWay(false);
    void isServerThere().then((isThere) => {
      if (isThere) reload();
      else setUnderWay(false);
    });
  }, [isUnderWay, reload]);
  return isUnderWay;
}
