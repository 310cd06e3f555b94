import { useState } from "react";

/** A value as it was when something began that holds it; the value itself when nothing does. */
export function useKeptWhile<T>(value: T, isHeld: boolean): T {
  const [kept, setKept] = useState(value);
  if (!isHeld && kept !== value) setKept(value);
  return isHeld ? kept : value;
}
