import type { Acrylic, Layer, Locate, MockupDocument } from "#shared/mockup/document.ts";
import { lengthOf, nameOf } from "../limits.ts";
import { withFields } from "../same.ts";
import { changeLayer } from "./change-layer.ts";

export type LayerFields = {
  readonly name?: string;
  readonly stock?: Acrylic;
  readonly thickness?: number;
  readonly locate?: Locate;
  readonly marked?: Layer["marked"];
};

/**
 * Sets what is given of a layer. An empty name or an impossible thickness leaves what was there. A layer that only bears
 * its stock's name goes on doing so when the stock changes.
 */
export function setLayer(document: MockupDocument, { key, ...fields }: LayerFields & { key: string }): MockupDocument {
  return changeLayer(document, key, (layer) =>
    withFields(layer, {
      name: nameOf(fields.name ?? nameAlong(layer, fields.stock)) ?? layer.name,
      stock: fields.stock ?? layer.stock,
      thickness: lengthOf(fields.thickness ?? layer.thickness, 100) ?? layer.thickness,
      locate: fields.locate ?? layer.locate,
      marked: fields.marked ?? layer.marked,
    }),
  );
}

function nameAlong({ name, stock }: Layer, next: Acrylic | undefined): string {
  return next !== undefined && name === stock.name ? next.name : name;
}
