/** A point in millimetres, x to the right, y down. */
export type Point = { readonly x: number; readonly y: number };

/** One step of an outline. Everything curved is a cubic: arcs and quadratics are turned into cubics where they enter. */
export type Segment =
  | { readonly kind: "line"; readonly to: Point }
  | { readonly kind: "cubic"; readonly c1: Point; readonly c2: Point; readonly to: Point };

/** A closed ring: the last segment returns to `start` by a straight line where it does not end there itself. */
export type Ring = { readonly start: Point; readonly segments: readonly Segment[] };

/** Closed rings filled by the even-odd rule, so that a ring inside another is a hole. */
export type Path = readonly Ring[];

/** A ring flattened to straight edges, without a repeated last point. */
export type Polygon = readonly Point[];

/** Polygons filled by the even-odd rule. What the kernel returns is free of crossings: outer rings and their holes. */
export type Region = readonly Polygon[];

/** An axis-parallel box in mm. */
export type Box = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };

/** Where a piece lies on the board: scaled, turned about its own origin, then moved. */
export type Placement = {
  readonly x: number;
  readonly y: number;
  /** Degrees clockwise as seen from the front. */
  readonly turn: number;
  readonly scale: number;
  readonly mirrored: boolean;
};
