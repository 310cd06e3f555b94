import type { MockupDocument } from "./document.ts";

/** The layer's name with the first number from 2 that no layer has. */
export function freeLayerName({ layers }: MockupDocument, name: string): string {
  const base = name.replace(/ \d+$/, "").slice(0, 110);
  const names = new Set(layers.map((layer) => layer.name));
  let number = 2;
  while (names.has(`${base} ${number}`)) number++;
  return `${base} ${number}`;
}
