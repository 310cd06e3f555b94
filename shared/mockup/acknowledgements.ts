import { faceStock } from "../stack/backer.ts";
import type { Figures } from "../stack/figures.ts";
import { signBox } from "../stack/sign-box.ts";
import { formatLengthWithUnit, formatSize } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { MockupDocument } from "./document.ts";
import { finishWords } from "./finish-words.ts";

/** What an approver confirms, one tick each. */
export type Acknowledgement = { readonly id: string; readonly text: string };

/** Reads the drawing back to the approver: every line of the words, size, colours, finish, hardware and what a yes means. */
export function acknowledgementsOf({
  document,
  figures,
  words,
  unit,
}: {
  document: MockupDocument;
  figures: Pick<Figures, "offWall">;
  words: string;
  unit: LengthUnit;
}): Acknowledgement[] {
  const { layers, quantity, backer, frame } = document;
  const { width, height } = signBox(document);
  const lines = words.split("\n").map((line) => line.trim());
  const asked: Acknowledgement[] = lines.flatMap((line, index) =>
    line ? [{ id: `words-${index + 1}`, text: `The words read exactly, letter by letter: “${line}”.` }] : [],
  );
  const offWall = formatLengthWithUnit(figures.offWall.nominal, unit);
  asked.push({
    id: "size",
    text: `The size is ${formatSize(width, height, unit)} and it stands ${offWall} off the wall.`,
  });
  const colours = [...new Set(layers.map(({ stock }) => stock.name))];
  if (colours.length > 0) {
    const face = `${backer.slats ? "slats of " : ""}${faceStock(backer).name}`;
    const framed = frame ? `, framed in ${frame.stock.name}` : "";
    asked.push({
      id: "colours",
      text: `The colours are ${colours.join(", ")} on ${face}${framed}. A screen shows them only nearly.`,
    });
  }
  asked.push({
    id: "finish",
    text:
      backer.finish.length === 0
        ? "The wood stays bare: no finish is put on it."
        : `The wood is finished in this order: ${finishWords(backer.finish)}.`,
  });
  const hardware = layers.flatMap(({ hold }) =>
    hold.kind === "standoff" && hold.holes.length > 0 ? [`${hold.holes.length} × ${hold.hardware.name}`] : [],
  );
  if (hardware.length > 0) asked.push({ id: "hardware", text: `The hardware is ${hardware.join(", ")}.` });
  if (quantity > 1) asked.push({ id: "quantity", text: `${quantity} signs are made from this drawing.` });
  asked.push({
    id: "terms",
    text: "Once it is cut and bonded a sign can't be changed. A later change is a new revision and may cost more.",
  });
  return asked;
}
