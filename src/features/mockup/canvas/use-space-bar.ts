import { type RefObject, useEffect, useRef } from "react";

/** Whether the space bar is down while the element has the focus or the pointer: a drag then looks around. */
export function useSpaceBar(element: RefObject<HTMLElement | null>): RefObject<boolean> {
  const down = useRef(false);
  useEffect(() => {
    const watched = element.current;
    if (!watched) return;
    const press = (event: KeyboardEvent) => {
      if (event.key !== " ") return;
      down.current = true;
      event.preventDefault();
    };
    const lift = (event: KeyboardEvent) => {
      if (event.key === " ") down.current = false;
    };
    const forget = () => {
      down.current = false;
    };
    watched.addEventListener("keydown", press);
    window.addEventListener("keyup", lift);
    window.addEventListener("blur", forget);
    return () => {
      watched.removeEventListener("keydown", press);
      window.removeEventListener("keyup", lift);
      window.removeEventListener("blur", forget);
    };
  }, [element]);
  return down;
}
