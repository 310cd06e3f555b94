import { useRef } from "react";
import type { PointerMarks } from "./rulers.tsx";

/** Lines on the rulers that follow the pointer. They are moved by themselves: nothing else on the page depends on where it is. */
export function usePointerMarks() {
  const x = useRef<SVGLineElement>(null);
  const y = useRef<SVGLineElement>(null);
  const marks: PointerMarks = { x, y };

  function follow(place: { readonly x: number; readonly y: number } | null) {
    for (const line of [x.current, y.current]) line?.classList.toggle("invisible", place === null);
    if (place === null) return;
    x.current?.setAttribute("transform", `translate(${place.x} 0)`);
    y.current?.setAttribute("transform", `translate(0 ${place.y})`);
  }
  return { marks, follow };
}
