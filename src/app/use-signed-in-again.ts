import { useQuery } from "@tanstack/react-query";
import { useEffect, useRef } from "react";
import { meQuery } from "@/lib/me.ts";

/**
 * Notices when whoever reads has signed in elsewhere, as by a mailed link that opened in a tab of its own: asked when this tab is seen
 * again. Calls `onSignedIn` once, and only when nobody was signed in before.
 */
export function useSignedInAgain(isWaiting: boolean, onSignedIn: () => void): void {
  const me = useQuery({ ...meQuery, staleTime: 0, enabled: isWaiting, refetchOnWindowFocus: "always" });
  const wasNobody = useRef(false);
  useEffect(() => {
    if (!isWaiting || !me.data) return;
    if (me.data.person === null) {
      wasNobody.current = true;
    } else if (wasNobody.current) {
      wasNobody.current = false;
      onSignedIn();
    }
  }, [isWaiting, me.data, onSignedIn]);
}
