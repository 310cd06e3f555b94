import { regionContains } from "../geometry/contains.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Point, Region } from "../geometry/path.ts";
import { circlePath } from "../geometry/shapes.ts";
import type { CapStud, Hole, MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import type { Item } from "./display-list.ts";
import { shadowDirection } from "./light.ts";
import { mixColours } from "./palette.ts";

/** A standoff where it stands, with its heights above the back of the board. */
export type PlacedStandoff = {
  readonly hole: Hole;
  readonly layerKey: string;
  readonly hardware: CapStud;
  /** Foot of the barrel, back and face of the panel, top of the cap. */
  readonly foot: number;
  readonly panelBack: number;
  readonly panelFace: number;
  readonly capTop: number;
};

/** Every standoff of the shown layers, with the heights of the piece it holds; one that holds no piece takes its layer's. */
export function placedStandoffs(document: MockupDocument, figures: Figures): PlacedStandoff[] {
  return document.layers.flatMap((layer): PlacedStandoff[] => {
    const { hold } = layer;
    if (hold.kind !== "standoff" || layer.hidden) return [];
    const ownFigures = figures.layers.find(({ key }) => key === layer.key);
    const pieces = figures.pieces.filter(({ layerKey }) => layerKey === layer.key);
    return hold.holes.flatMap((hole) => {
      const held = pieces.find(({ region }) => regionContains(region, hole)) ?? ownFigures;
      if (!held) return [];
      const panelBack = held.bottom.nominal;
      const panelFace = held.top.nominal;
      return [
        {
          hole,
          layerKey: layer.key,
          hardware: hold.hardware,
          foot: panelBack - hold.offset,
          panelBack,
          panelFace,
          capTop: panelFace + hold.hardware.capThickness,
        },
      ];
    });
  });
}

/** A disc's outline as straight edges, as shadows take it. */
export function discRegion(centre: Point, diameter: number): Region {
  return flattenPath(circlePath(centre, diameter / 2));
}

/** A metal cap from the front: a turned rim, a face and the light's glint on it. */
export function drawCap({ hole, hardware }: PlacedStandoff, light: { azimuth: number }, lineMm: number): Item[] {
  const radius = hardware.capDiameter / 2;
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
