import { useCallback, useEffect, useRef, useState } from "react";
import type { LengthUnit } from "#shared/units/length.ts";
import { type DeskAids, usualAids } from "../model/desk-aids.ts";
import { browserStorage, findAids, keepAids } from "./kept-aids.ts";

/** Rulers, grid and margin as a person chose them, remembered in this browser where it lets pages keep anything. */
export function useDeskAids(personId: string, unit: LengthUnit) {
  const [aids, setAids] = useState(() => findAids(browserStorage(), personId) ?? usualAids(unit));
  const found = useRef(aids);
  useEffect(() => {
    // What nobody chose is not kept: it follows what people usually begin with.
    if (aids !== found.current) keepAids(browserStorage(), personId, aids);
  }, [aids, personId]);
  const changeAids = useCallback((change: Partial<DeskAids>) => setAids((before) => ({ ...before, ...change })), []);
  return { aids, changeAids };
}
