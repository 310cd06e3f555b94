import type { Rule } from "./rule.ts";
import { adhesiveFits } from "./rules/adhesive-fits.ts";
import { bed } from "./rules/bed.ts";
import { bondMismatch } from "./rules/bond-mismatch.ts";
import { brads } from "./rules/brads.ts";
import { breakThrough } from "./rules/break-through.ts";
import { capOnLevel } from "./rules/cap-on-level.ts";
import { cladding } from "./rules/cladding.ts";
import { colourAgainstArtwork } from "./rules/colour-against-artwork.ts";
import { contrast } from "./rules/contrast.ts";
import { dropOuts } from "./rules/drop-outs.ts";
import { footOnWood } from "./rules/foot-on-wood.ts";
import { frameEdges } from "./rules/frame-edges.ts";
import { freeToMove } from "./rules/free-to-move.ts";
import { grip } from "./rules/grip.ts";
import { handed } from "./rules/handed.ts";
import { hanging } from "./rules/hanging.ts";
import { holeToEdge } from "./rules/hole-to-edge.ts";
import { holeWindow } from "./rules/hole-window.ts";
import { inOnePlace } from "./rules/in-one-place.ts";
import { licensedPractice } from "./rules/licensed-practice.ts";
import { load } from "./rules/load.ts";
import { locate } from "./rules/locate.ts";
import { mixedSupport } from "./rules/mixed-support.ts";
import { onlySlat } from "./rules/only-slat.ts";
import { outsideBoard } from "./rules/outside-board.ts";
import { pocket } from "./rules/pocket.ts";
import { protrusion } from "./rules/protrusion.ts";
import { pushAndSag } from "./rules/push-and-sag.ts";
import { readingDistance } from "./rules/reading-distance.ts";
import { sawSetting } from "./rules/saw-setting.ts";
import { screwInBarrel } from "./rules/screw-in-barrel.ts";
import { slivers } from "./rules/slivers.ts";
import { smallPieces } from "./rules/small-pieces.ts";
import { stockOnHand } from "./rules/stock-on-hand.ts";
import { thinGap } from "./rules/thin-gap.ts";
import { thinStroke } from "./rules/thin-stroke.ts";
import { twins } from "./rules/twins.ts";
import { unsupported } from "./rules/unsupported.ts";
import { wordsAgainstBrief } from "./rules/words-against-brief.ts";

/** Every rule there is. A new one is added here and nowhere else. */
export const rules: readonly Rule[] = [
  unsupported,
  mixedSupport,
  thinStroke,
  thinGap,
  dropOuts,
  holeWindow,
  holeToEdge,
  grip,
  screwInBarrel,
  breakThrough,
  onlySlat,
  load,
  capOnLevel,
  footOnWood,
  pushAndSag,
  freeToMove,
  bondMismatch,
  adhesiveFits,
  pocket,
  locate,
  bed,
  stockOnHand,
  colourAgainstArtwork,
  readingDistance,
  contrast,
  wordsAgainstBrief,
  outsideBoard,
  smallPieces,
  handed,
  twins,
  brads,
  slivers,
  sawSetting,
  frameEdges,
  cladding,
  hanging,
  protrusion,
  licensedPractice,
  inOnePlace,
];
