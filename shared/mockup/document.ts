import { z } from "zod";

/**
 * The mockup document: what a maker edits, a revision freezes and every figure is computed from.
 * Lengths mm, angles degrees, x right and y down from the board's upper left corner, z from the back of the board to the viewer.
 * A changed meaning gets a new version and a step in upgrade.ts; old documents are never rewritten in place.
 */
export const documentVersion = 1;

/** Largest sign, piece or offset we take. Beyond it figures mean nothing and the canvas can't show them. */
const longestMm = 10_000;
const length = z.number().finite().positive().max(longestMm);
const coordinate = z.number().finite().min(-longestMm).max(longestMm);
const key = z.string().regex(/^[A-Z]{1,2}$/, "A layer's key is one or two capital letters.");
const id = z.string().min(1).max(64);
const name = z.string().trim().min(1).max(120);
const colour = z.string().regex(/^#[0-9A-F]{6}$/, "A colour is # and six hexadecimal digits in capitals.");

const point = z.strictObject({ x: coordinate, y: coordinate });
const segment = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("line"), to: point }),
  z.strictObject({ kind: z.literal("cubic"), c1: point, c2: point, to: point }),
]);
const ring = z.strictObject({ start: point, segments: z.array(segment).min(1).max(100_000) });
export const pathSchema = z.array(ring).max(10_000);

export const placementSchema = z.strictObject({
  x: coordinate,
  y: coordinate,
  turn: z.number().finite().min(-360).max(360),
  scale: z.number().finite().positive().max(1000),
  mirrored: z.boolean(),
});

/** Sheet acrylic as it was when it was chosen: a later change of the stock list does not change a drawing. */
export const acrylicSchema = z.strictObject({
  kind: z.literal("acrylic"),
  stockId: z.uuid().nullable(),
  name,
  colour,
  look: z.enum(["opaque", "frosted", "clear", "mirror"]),
  process: z.enum(["cast", "extruded"]),
  facesDiffer: z.boolean(),
  densityKgM3: z.number().finite().positive().max(25_000),
});

export const woodSchema = z.strictObject({
  kind: z.literal("wood"),
  stockId: z.uuid().nullable(),
  name,
  colour,
  /** Specific gravity at 12 % moisture on oven-dry mass, as the Wood Handbook lists it. */
  gravity: z.number().finite().positive().max(1.5),
  moisturePercent: z.number().finite().min(0).max(30),
  hardness: z.enum(["softwood", "hardwood"]),
});

export const adhesiveSchema = z.strictObject({
  stockId: z.uuid().nullable(),
  name,
  family: z.enum([
    "solvent cement",
    "bodied cement",
    "cyanoacrylate",
    "epoxy",
    "neutral silicone",
    "high-bond tape",
    "wood glue",
  ]),
});

export const capStudSchema = z.strictObject({
  kind: z.literal("capStud"),
  stockId: z.uuid().nullable(),
  name,
  finish: colour,
  barrelDiameter: length,
  /** Bore depth plus floor thickness: the height the panel's back stands above the wood. */
  barrelLength: length,
  boreDiameter: length,
  boreDepth: length,
  floorThickness: length,
  floorHole: length,
  countersunk: z.boolean(),
  studDiameter: length,
  studLength: length,
  capDiameter: length,
  capThickness: length,
  screw: z.strictObject({ name, diameter: length, length, headDiameter: length, headHeight: length }),
});

/** A hole in the pieces of a standoff layer. One hole of a layer is the fixed one, the others have play. */
export const holeSchema = z.strictObject({ id, x: coordinate, y: coordinate, diameter: length, fixed: z.boolean() });

export const holdSchema = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("bond"), adhesive: adhesiveSchema }),
  z.strictObject({
    kind: z.literal("pocket"),
    depth: length,
    clearance: z.number().finite().min(0).max(5),
    adhesive: adhesiveSchema,
  }),
  z.strictObject({
    kind: z.literal("standoff"),
    hardware: capStudSchema,
    offset: z.number().finite().min(0).max(1000),
    holes: z.array(holeSchema).max(1000),
  }),
]);

export const pieceSchema = z.strictObject({
  id,
  name: z.string().trim().max(120),
  source: z.discriminatedUnion("kind", [
    z.strictObject({ kind: z.literal("artwork"), artworkId: z.uuid(), index: z.int().min(0), colour }),
    z.strictObject({ kind: z.literal("plate") }),
  ]),
  /** In the piece's own plane, about its own origin: the centre of its box when it was brought in. */
  path: pathSchema,
  placement: placementSchema,
});

export const locateSchema = z.enum(["pocket", "scored line", "template", "hole pattern", "none"]);

export const layerSchema = z.strictObject({
  key,
  name,
  stock: acrylicSchema,
  thickness: length.max(100),
  hold: holdSchema,
  locate: locateSchema,
  pieces: z.array(pieceSchema).max(2000),
  hidden: z.boolean(),
});

export const documentSchema = z
  .strictObject({
    version: z.literal(documentVersion),
    board: z.strictObject({
      outline: z.literal("rectangle"),
      width: length,
      height: length,
      measures: z.enum(["body", "overall"]),
    }),
    hanging: z.strictObject({
      kind: z.enum(["cleat", "keyholes", "wire", "screwed through", "none"]),
      gap: z.number().finite().min(0).max(500),
    }),
    quantity: z.int().min(1).max(1000),
    backer: z.strictObject({
      kind: z.literal("plain"),
      stock: woodSchema,
      thickness: length.max(200),
      finish: z.string().trim().max(200),
    }),
    /** From the wall outward. Key A is the backer's, layers start at B. */
    layers: z.array(layerSchema).max(60),
    presentation: z.strictObject({
      wall: colour,
      light: z.strictObject({
        /** Degrees clockwise from the top. */
        azimuth: z.number().finite().min(0).max(360),
        /** Degrees over the wall plane; 90 is head-on. */
        elevation: z.number().finite().min(10).max(90),
        /** Radians. */
        angularSize: z.number().finite().min(0).max(1),
      }),
      viewingDistance: z.number().finite().positive().max(200_000),
    }),
  })
  .superRefine((document, context) => {
    const keys = new Set<string>(["A"]);
    const ids = new Set<string>();
    for (const [index, layer] of document.layers.entries()) {
      if (keys.has(layer.key))
        context.addIssue({
          code: "custom",
          path: ["layers", index, "key"],
          message: `Key ${layer.key} is used twice.`,
        });
      keys.add(layer.key);
      const held = layer.hold.kind === "standoff" ? layer.hold.holes : [];
      for (const thing of [...layer.pieces, ...held]) {
        if (ids.has(thing.id))
          context.addIssue({ code: "custom", path: ["layers", index], message: `The id ${thing.id} is used twice.` });
        ids.add(thing.id);
      }
    }
  });

export type MockupDocument = z.infer<typeof documentSchema>;
export type Layer = z.infer<typeof layerSchema>;
export type Piece = z.infer<typeof pieceSchema>;
export type Hold = z.infer<typeof holdSchema>;
export type Hole = z.infer<typeof holeSchema>;
export type CapStud = z.infer<typeof capStudSchema>;
export type Acrylic = z.infer<typeof acrylicSchema>;
export type Wood = z.infer<typeof woodSchema>;
export type Adhesive = z.infer<typeof adhesiveSchema>;
export type Locate = z.infer<typeof locateSchema>;
