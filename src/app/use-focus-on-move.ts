import { useEffect, useRef } from "react";
import { useLocation } from "react-router-dom";

/** After a move to another page the focus goes to its main part, so that keyboard and screen reader start there. */
export function useFocusOnMove(): void {
  const { pathname } = useLocation();
  const before = useRef(pathname);
  useEffect(() => {
    if (before.current === pathname) return;
    before.current = pathname;
    document.querySelector("main")?.focus({ preventScroll: true });
  }, [pathname]);
}
