import { flattenPath } from "../geometry/flatten.ts";
import type { Point, Region } from "../geometry/path.ts";
import { circlePath } from "../geometry/shapes.ts";
import { frontHeightMm, frontOf } from "../hardware/standoff-parts.ts";
import type { Hardware, Hole, MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import { holdsPiece } from "../stack/held-piece.ts";
import type { Item } from "./display-list.ts";
import { shadowDirection } from "./light.ts";
import { mixColours } from "./palette.ts";

/** A standoff where it stands, with its heights above the back of the board. */
export type PlacedStandoff = {
  readonly hole: Hole;
  readonly layerKey: string;
  readonly hardware: Hardware;
  readonly barrel: Cylinder;
  /** What is seen from the front: a cap, a screw's head, a grip; null for what is hidden behind the panel. */
  readonly front: Cylinder | null;
};

/** Turned metal, with its heights above the back of the board. */
export type Cylinder = { readonly diameter: number; readonly from: number; readonly to: number };

/** Every standoff of the shown layers, with the heights of the piece it holds; one that holds no piece takes its layer's. */
export function placedStandoffs(document: MockupDocument, figures: Figures): PlacedStandoff[] {
  return document.layers.flatMap((layer): PlacedStandoff[] => {
    const { hold } = layer;
    if (hold.kind !== "standoff" || layer.hidden) return [];
    const ownFigures = figures.layers.find(({ key }) => key === layer.key);
    const pieces = figures.pieces.filter(({ layerKey }) => layerKey === layer.key);
    return hold.holes.flatMap((hole) => {
      const held = pieces.find(({ region }) => holdsPiece(hold.hardware, region, hole)) ?? ownFigures;
      if (!held) return [];
      const back = held.bottom.nominal;
      const heights = { foot: back - hold.offset, back, face: held.top.nominal };
      return [{ hole, layerKey: layer.key, hardware: hold.hardware, ...bodiesOf(hold.hardware, heights) }];
    });
  });
}

type PanelHeights = { readonly foot: number; readonly back: number; readonly face: number };

function bodiesOf(hardware: Hardware, { foot, back, face }: PanelHeights): Pick<PlacedStandoff, "barrel" | "front"> {
  const hidden = hardware.kind === "blindStud" && hardware.barrelLength === 0;
  const diameter = hidden ? hardware.studDiameter : hardware.barrelDiameter;
  const barrel = { diameter, from: foot, to: Math.max(foot, back) };
  const to = foot + frontHeightMm(hardware, face - foot);
  if (hardware.kind === "edgeGrip") return { barrel, front: { diameter, from: face, to } };
  const front = frontOf(hardware);
  return { barrel, front: front && { diameter: front.diameter, from: face, to } };
}

/** A disc's outline as straight edges, as shadows take it. */
export function discRegion(centre: Point, diameter: number): Region {
  return flattenPath(circlePath(centre, diameter / 2));
}

/** Metal from the front: a turned rim, a face and the light's glint on it. Nothing for what is hidden. */
export function drawFront(
  { hole, hardware, front }: PlacedStandoff,
  light: { azimuth: number },
  lineMm: number,
): Item[] {
  if (!front) return [];
  const radius = front.diameter / 2;
  const centre = { x: hole.x, y: hole.y };
  const away = shadowDirection({ azimuth: light.azimuth, elevation: 45, angularSize: 0 });
  const towards = (share: number): Point => ({
    x: centre.x - away.x * radius * share,
    y: centre.y - away.y * radius * share,
  });
  const id = `hole:${hole.id}`;
  const metal = hardware.finish;
  const disc = (middle: Point, share: number, fill: string, opacity?: number): Item => ({
    kind: "path",
    id,
    path: circlePath(middle, radius * share),
    fill,
    ...(opacity === undefined ? {} : { opacity }),
  });
  return [
    {
      kind: "path",
      id,
      path: circlePath(centre, radius),
      fill: mixColours(metal, "#2A2622", 0.38),
      stroke: { colour: mixColours(metal, "#1F1D1A", 0.7), widthMm: lineMm },
    },
    disc(towards(0.05), 0.9, mixColours(metal, "#FFFFFF", 0.3)),
    disc(towards(-0.02), 0.8, mixColours(metal, "#2A2622", 0.06)),
    disc(towards(0.14), 0.6, mixColours(metal, "#FFFFFF", 0.28)),
    disc(towards(0.24), 0.34, "#FFFFFF", 0.5),
  ];
}
