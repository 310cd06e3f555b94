import { usualOffsetMm } from "#shared/hardware/standoff-parts.ts";
import type { Adhesive, Hardware, MockupDocument } from "#shared/mockup/document.ts";
import type { Bounds } from "../length-bounds.ts";
import { bitRadiusBounds, clearanceBounds, lengthOf, mostOffsetMm, pocketDepthBounds, roundMm } from "../limits.ts";
import { propose, type Site } from "../propose-holes.ts";
import { isSame, withFields } from "../same.ts";
import { changeLayer } from "./change-layer.ts";
import { startOfHold } from "./new-layer.ts";

/** Bonds a layer down. Holes of standoffs go, and with them their pattern as the way to find the place. */
export function bondLayer(
  document: MockupDocument,
  { key, adhesive }: { key: string; adhesive: Adhesive },
): MockupDocument {
  return changeLayer(document, key, (layer) => {
    if (layer.hold.kind === "bond" && isSame(layer.hold.adhesive, adhesive)) return layer;
    const locate = layer.locate === "hole pattern" || layer.locate === "pocket" ? "none" : layer.locate;
    return { ...layer, hold: { kind: "bond", adhesive, tack: null }, locate };
  });
}

/** Lets a layer into what it lies on. One that was let in before keeps its pocket and only takes the other adhesive. */
export function letInLayer(
  document: MockupDocument,
  { key, adhesive }: { key: string; adhesive: Adhesive },
): MockupDocument {
  return changeLayer(document, key, (layer) =>
    layer.hold.kind === "pocket"
      ? withFields(layer, { hold: withFields(layer.hold, { adhesive }) })
      : { ...layer, hold: startOfHold({ kind: "pocket", adhesive }, layer.thickness), locate: "pocket" },
  );
}

export type PocketFields = {
  readonly depth?: number;
  readonly clearance?: number;
  readonly cut?: "routed" | "engraved";
  readonly bitRadius?: number;
};

/** Sets what is given of a layer's pocket, in mm; an impossible measure leaves what was there. */
export function setPocket(
  document: MockupDocument,
  { key, ...fields }: PocketFields & { key: string },
): MockupDocument {
  return changeLayer(document, key, (layer) => {
    const { hold } = layer;
    if (hold.kind !== "pocket") return layer;
    const within = (value: number | undefined, { most }: Bounds, now: number) =>
      value !== undefined && value >= 0 && value <= most ? roundMm(value) : now;
    return withFields(layer, {
      hold: withFields(hold, {
        depth: lengthOf(fields.depth ?? hold.depth, pocketDepthBounds.most) ?? hold.depth,
        clearance: within(fields.clearance, clearanceBounds, hold.clearance),
        cut: fields.cut ?? hold.cut,
        bitRadius: within(fields.bitRadius, bitRadiusBounds, hold.bitRadius),
      }),
    });
  });
}

/** Sets what holds a bonded layer's place before its adhesive, or that nothing does. */
export function setTack(
  document: MockupDocument,
  { key, tack }: { key: string; tack: Adhesive | null },
): MockupDocument {
  return changeLayer(document, key, (layer) =>
    layer.hold.kind === "bond" ? withFields(layer, { hold: withFields(layer.hold, { tack }) }) : layer,
  );
}

/**
 * Puts a layer on standoffs as high as the hardware's barrel. A layer that was on standoffs keeps its holes; another one
 * gets holes proposed, with ids made from `id`.
 */
export function standLayer(
  document: MockupDocument,
  { key, hardware, id, site }: { key: string; hardware: Hardware; id: string; site: Site },
): MockupDocument {
  return changeLayer(document, key, (layer) => {
    const offset = usualOffsetMm(hardware);
    if (layer.hold.kind === "standoff")
      return withFields(layer, { hold: withFields(layer.hold, { hardware, offset }) });
    const holes = propose(layer, { hardware, id, document, site });
    return { ...layer, hold: { kind: "standoff", hardware, offset, holes }, locate: "hole pattern" };
  });
}

/**
 * Raises a standoff layer to `offset` mm above what it stands over. `hardware` comes along when the offset caught on a
 * barrel (see `catchBarrel`); without it the hardware stays and the dry fit says that barrel and offset differ.
 */
export function raiseLayer(
  document: MockupDocument,
  { key, offset, hardware }: { key: string; offset: number; hardware?: Hardware | undefined },
): MockupDocument {
  if (!Number.isFinite(offset)) return document;
  const held = roundMm(Math.min(mostOffsetMm, Math.max(0, offset)));
  return changeLayer(document, key, (layer) =>
    layer.hold.kind === "standoff"
      ? withFields(layer, { hold: withFields(layer.hold, { offset: held, hardware: hardware ?? layer.hold.hardware }) })
      : layer,
  );
}
