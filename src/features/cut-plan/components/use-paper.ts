import { type RefObject, useRef } from "react";
import { useRoom } from "@/lib/use-room.ts";

/** Lettering of 3.4 mm on a drawing is then 12.9 px high on the screen. */
export const mmPerPx = 0.263;
export const paddingPx = 26;
const least = 60;
const most = 270;

/** The paper that drawings of this width have, mm; null before it was measured. */
export function usePaper(): { readonly ref: RefObject<HTMLDivElement | null>; readonly paperMm: number | null } {
  const ref = useRef<HTMLDivElement>(null);
  const room = useRoom(ref);
  const paperMm = room && Math.min(most, Math.max(least, Math.round((room.width - paddingPx) * mmPerPx)));
  return { ref, paperMm };
}
