import { regionAreaMm2 } from "../geometry/area.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Path, Region } from "../geometry/path.ts";
import { smallestBox } from "../geometry/smallest-box.ts";
import { isShorter } from "../geometry/tolerance.ts";
import type { Named } from "./join-outlines.ts";
import { partsOfOutline } from "./parts-of-outline.ts";
import { type Outline, type Shaped, shapedAboutMiddle } from "./shaped.ts";

/** A bit is loose when it covers less, or is slimmer over the shorter side of its smallest box; 0 asks for nothing. */
export type LooseBelow = { readonly areaMm2: number; readonly widthMm: number };

export type LooseBit = {
  readonly id: string;
  readonly region: Region;
  readonly areaMm2: number;
  readonly lengthMm: number;
  readonly widthMm: number;
};

/** A piece with loose bits: what is left of it without them, null when it is nothing but such bits. */
export type WithoutBits = { readonly id: string; readonly left: Shaped | null; readonly bits: readonly LooseBit[] };

/** Finds the loose bits of outlines; only outlines that have some are given. Their own curves stay as they are. */
export function looseBits(outlines: readonly Named<Outline>[], below: LooseBelow, kernel: Kernel): WithoutBits[] {
  return outlines.flatMap((outline) => {
    const { placement, parts } = partsOfOutline(outline, kernel);
    const bits: LooseBit[] = [];
    const stays: Path[] = [];
    for (const { path, region } of parts) {
      const bit = measured(outline.id, region);
      if (bit.areaMm2 < below.areaMm2 || isShorter(bit.widthMm, below.widthMm)) bits.push(bit);
      else stays.push(path);
    }
    if (bits.length === 0) return [];
    const left = stays.length === 0 ? null : shapedAboutMiddle({ path: stays.flat(), placement });
    return [{ id: outline.id, left, bits }];
  });
}

function measured(id: string, region: Region): LooseBit {
  const box = smallestBox(region);
  return {
    id,
    region,
    areaMm2: regionAreaMm2(region),
    lengthMm: box?.length ?? 0,
    widthMm: box?.width ?? 0,
  };
}
