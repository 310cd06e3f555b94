import type { Box, Point, Region } from "../geometry/path.ts";
import type { SmallestBox } from "../geometry/smallest-box.ts";
import type { Banded } from "../units/banded.ts";

export type { Banded };

export type PieceFigures = {
  readonly pieceId: string;
  readonly layerKey: string;
  /** On the board: outline flattened to 0.02 mm, holes of the layer's hardware not cut out. */
  readonly region: Region;
  readonly box: Box;
  readonly centroid: Point;
  readonly areaMm2: number;
  readonly perimeterMm: number;
  /** The smallest box round it, turned as need be; null when it covers nothing. */
  readonly smallestBox: SmallestBox | null;
  /** Nodes of its outline as drawn. */
  readonly nodes: number;
  /** What it stands on: layer keys below it, highest first; "A" is the backer; none when it stands on nothing. */
  readonly restsOn: readonly string[];
  /** Height of its back and its face above the back of the board. */
  readonly bottom: Banded;
  readonly top: Banded;
  /** Less hardware holes and pockets. */
  readonly massG: number;
};

export type LayerFigures = {
  readonly key: string;
  readonly name: string;
  readonly pieces: number;
  readonly top: Banded;
  readonly bottom: Banded;
  readonly massG: number;
};

export type Figures = {
  readonly backerTop: Banded;
  readonly backerMassG: number;
  readonly layers: readonly LayerFigures[];
  readonly pieces: readonly PieceFigures[];
  readonly hardwareCount: number;
  readonly massG: number;
  /** From the back of the board to the highest thing, cap included; the gap of the hanging is not in it. */
  readonly depth: Banded;
  /** depth + gap from the wall. */
  readonly offWall: Banded;
};
