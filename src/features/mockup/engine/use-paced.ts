import { useEffect, useEffectEvent, useState } from "react";

/** A value that follows another so many ms apart while that is asked for, beginning with what it was before; else the other itself. */
export function usePaced<T>(
  value: T,
  { isPaced, everyMs }: { readonly isPaced: boolean; readonly everyMs: number },
): T {
  const [kept, setKept] = useState(value);
  if (!isPaced && kept !== value) setKept(value);
  const catchUp = useEffectEvent(() => setKept(value));
  useEffect(() => {
    if (!isPaced) return;
    const timer = setInterval(() => catchUp(), everyMs);
    return () => clearInterval(timer);
  }, [isPaced, everyMs]);
  return isPaced ? kept : value;
}
