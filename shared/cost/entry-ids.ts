import type { Stock } from "../materials/stock.ts";
import type { Acrylic, Adhesive, Coat, Hardware, MockupDocument, Screw, Wood } from "../mockup/document.ts";

/*
 * Under which id the price book has a thing. A thing of the stock list goes by its row there, so that a new name keeps the
 * price; a drawing that was made without the list is looked up by name.
 */

type Stocked = { readonly stockId: string | null; readonly name: string };

function rowOf({ stockId, name }: Stocked, rows: readonly Stocked[]): string {
  const known =
    rows.find((row) => stockId !== null && row.stockId === stockId) ?? rows.find((row) => row.name === name);
  return known?.stockId ?? stockId ?? name;
}

/** Thousandths of a millimetre, so that one thickness is written one way. */
const mm = (length: number): string => String(Number(length.toFixed(3)));

export const sheetId = (acrylic: Acrylic, thicknessMm: number, { acrylics }: Pick<Stock, "acrylics">): string =>
  `sheet ${rowOf(
    acrylic,
    acrylics.map((row) => row.acrylic),
  )} ${mm(thicknessMm)}`;

export const boardId = (wood: Wood, thicknessMm: number, stock: Pick<Stock, "woods">): string =>
  `board ${woodRow(wood, stock)} ${mm(thicknessMm)}`;

/** A strip of wood by its section: slats, spines and frames are cut from it. */
export const stripId = (
  wood: Wood,
  { widthMm, thicknessMm }: { readonly widthMm: number; readonly thicknessMm: number },
  stock: Pick<Stock, "woods">,
): string => `strip ${woodRow(wood, stock)} ${mm(widthMm)} ${mm(thicknessMm)}`;

const woodRow = (wood: Wood, { woods }: Pick<Stock, "woods">): string =>
  rowOf(
    wood,
    woods.map((row) => row.wood),
  );

export const hardwareId = (one: Hardware, { hardware }: Pick<Stock, "hardware">): string =>
  `hardware ${rowOf(
    one,
    hardware.map((row) => row.hardware),
  )}`;

/** Screws go by name: a drawing's standoff carries its screw without a row of the stock list. */
export const screwId = ({ name }: Pick<Screw, "name">): string => `screw ${name}`;

export const hangingId = (kind: MockupDocument["hanging"]["kind"]): string => `hanging ${kind}`;

export const adhesiveId = (one: Adhesive, { adhesives }: Pick<Stock, "adhesives">): string =>
  `adhesive ${rowOf(one, adhesives)}`;

/** The first of that family in stock glues what the drawing names no adhesive for; its family's name where there is none. */
export const adhesiveIdOfFamily = (family: Adhesive["family"], stock: Pick<Stock, "adhesives">): string => {
  const found = stock.adhesives.find((row) => row.family === family);
  return found ? adhesiveId(found, stock) : `adhesive ${family}`;
};

/** Coats go by name; every grit of sanding is one. */
export const coatId = (coat: Coat): string => (coat.kind === "sanding" ? "sanding" : `coat ${coat.name}`);
