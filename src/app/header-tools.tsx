import { createContext, type ReactNode, useContext } from "react";
import { createPortal } from "react-dom";

export const HeaderSlot = createContext<HTMLElement | null>(null);

/** Puts a page's own tools into the right end of the header; on a phone they stand in a row below it. */
export function HeaderTools({ children }: { readonly children: ReactNode }) {
  const slot = useContext(HeaderSlot);
  return slot === null ? null : createPortal(children, slot);
}
