import type { Rule } from "./rule.ts";
import { bed } from "./rules/bed.ts";
import { colourAgainstArtwork } from "./rules/colour-against-artwork.ts";
import { grip } from "./rules/grip.ts";
import { holeToEdge } from "./rules/hole-to-edge.ts";
import { holeWindow } from "./rules/hole-window.ts";
import { locate } from "./rules/locate.ts";
import { mixedSupport } from "./rules/mixed-support.ts";
import { outsideBoard } from "./rules/outside-board.ts";
import { screwInBarrel } from "./rules/screw-in-barrel.ts";
import { thinStroke } from "./rules/thin-stroke.ts";
import { unsupported } from "./rules/unsupported.ts";

/** Every rule there is. A new one is added here and nowhere else. */
export const rules: readonly Rule[] = [
  unsupported,
  mixedSupport,
  thinStroke,
  holeWindow,
  holeToEdge,
  grip,
  screwInBarrel,
  locate,
  bed,
  colourAgainstArtwork,
  outsideBoard,
];
