import { useEffect, useState } from "react";

/** Whether an instant is still to come; draws again when it passes. False for null. */
export function useUntil(instant: string | null): boolean {
  const end = instant === null ? 0 : Date.parse(instant);
  const [passed, setPassed] = useState<number | null>(null);
  const isToCome = passed !== end && end > Date.now();
  useEffect(() => {
    const left = end - Date.now();
    if (left <= 0) return;
    const timer = setTimeout(() => setPassed(end), left);
    return () => clearTimeout(timer);
  }, [end]);
  return isToCome;
}
