import { createContext, useContext } from "react";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";
import type { BandWording } from "#shared/units/format-band.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import type { DeskAids } from "../model/desk-aids.ts";
import type { Edit } from "../model/editor.ts";
import type { Site } from "../model/propose-holes.ts";
import type { Selection } from "../model/selection.ts";
import type { StockChoices } from "../model/stock-choices.ts";
import type { CopyPlace } from "./copy-shelf.ts";

/** What every panel of the mockup works on. */
export type Desk = {
  readonly document: MockupDocument;
  readonly selection: Selection;
  readonly unit: LengthUnit;
  readonly stock: StockChoices;
  readonly site: Site;
  /** The words that the sign shall bear, a line a line. */
  readonly briefWords: string;
  /** How heights are lettered in schedule and section. */
  readonly heights: BandWording;
  readonly letterHeights: (heights: BandWording) => void;
  /** Of the document, or of what it was a moment ago; null until they were first computed. */
  readonly figures: Figures | null;
  /** The document that the figures are of. */
  readonly figuresOf: MockupDocument;
  /** The standoff layer into which a press on the elevation puts a hole; null while a press chooses. */
  readonly holesByHand: string | null;
  readonly putHolesByHand: (key: string | null) => void;
  /** Whose jobs what is copied can be pasted in. */
  readonly client: string;
  readonly copyPlace: CopyPlace;
  /** Rulers, grid and margin, as this person has them. */
  readonly aids: DeskAids;
  readonly changeAids: (change: Partial<DeskAids>) => void;
  readonly edit: (edit: Edit) => void;
  readonly choose: (selection: Selection) => void;
  /** Says something where it is seen and heard, until something else is said. */
  readonly say: (words: string) => void;
};

export const DeskContext = createContext<Desk | null>(null);

/** The desk of the mockup that is open. Only below it. */
export function useDesk(): Desk {
  const desk = useContext(DeskContext);
  if (desk === null) throw new Error("useDesk is used outside a mockup");
  return desk;
}
