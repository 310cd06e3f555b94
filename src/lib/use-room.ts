import { type RefObject, useLayoutEffect, useState } from "react";
import type { Size } from "./drawing-view.ts";

/** Inner size of an element in px, kept up to date; null before it was measured or while it isn't shown. */
export function useRoom(element: RefObject<HTMLElement | null>): Size | null {
  const [room, setRoom] = useState<Size | null>(null);

  useLayoutEffect(() => {
    const watched = element.current;
    if (!watched) return;
    const measure = () => {
      const { clientWidth: width, clientHeight: height } = watched;
      setRoom((before) => {
        if (width === 0 || height === 0) return null;
        return before?.width === width && before.height === height ? before : { width, height };
      });
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(watched);
    return () => observer.disconnect();
  }, [element]);

  return room;
}
