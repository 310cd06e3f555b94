import { finishColour } from "../colour/finish-colour.ts";
import type { Backer } from "../mockup/document.ts";
import { faceStock } from "../stack/backer.ts";
import type { Colour } from "./display-list.ts";

/** The colour of the wood that is seen from the front, as its finish is estimated to leave it. */
export const faceColour = (backer: Backer): Colour => finishColour(faceStock(backer).colour, backer.finish);
