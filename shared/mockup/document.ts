import { z } from "zod";
import { type capStudSchema, hardwareSchema } from "./hardware-schemas.ts";
import { letteringSchema } from "./lettering-schema.ts";
import { pieceSourceSchema } from "./piece-source.ts";
import {
  colour,
  coordinate,
  id,
  leastBoardMm,
  length,
  line,
  longestMm,
  name,
  pathSchema,
  point,
} from "./schema-parts.ts";
import { acrylicSchema, adhesiveSchema, coatSchema, type screwSchema, woodSchema } from "./stock-schemas.ts";
import { wallPhotoSchema } from "./wall-photo.ts";

/**
 * The mockup document: what a maker edits, a revision freezes and every figure is computed from.
 * Lengths mm, angles degrees, x right and y down from the board's upper left corner, z from the back of the board to the viewer.
 * A changed meaning gets a new version and a step in upgrade.ts; old documents are never rewritten in place.
 */
export const documentVersion = 4;

const boardSide = length.min(leastBoardMm, `A board is at least ${leastBoardMm} mm wide and high.`);
const key = z.string().regex(/^[A-Z]{1,2}$/, "A layer's key is one or two capital letters.");

export const placementSchema = z.strictObject({
  x: coordinate,
  y: coordinate,
  turn: z.number().finite().min(-360).max(360),
  scale: z.number().finite().positive().max(1000),
  mirrored: z.boolean(),
});

/**
 * Place of a standoff. Where its kind passes the panel a hole of that diameter is drilled there; else the diameter says
 * nothing. One hole of a layer is the fixed one, the others have play.
 */
export const holeSchema = z.strictObject({ id, x: coordinate, y: coordinate, diameter: length, fixed: z.boolean() });

export const holdSchema = z.discriminatedUnion("kind", [
  z.strictObject({
    kind: z.literal("bond"),
    adhesive: adhesiveSchema,
    /** What holds the place first, where the joint is made in two steps. */
    tack: adhesiveSchema.nullable(),
  }),
  z.strictObject({
    kind: z.literal("pocket"),
    depth: length,
    clearance: z.number().finite().min(0).max(5),
    adhesive: adhesiveSchema,
    cut: z.enum(["routed", "engraved"]),
    /** Of the round bit that cuts it; 0 for a beam or a square corner. */
    bitRadius: z.number().finite().min(0).max(25),
  }),
  z.strictObject({
    kind: z.literal("standoff"),
    hardware: hardwareSchema,
    offset: z.number().finite().min(0).max(1000),
    holes: z.array(holeSchema).max(1000),
  }),
]);

export const pieceSchema = z.strictObject({
  id,
  name: line,
  source: pieceSourceSchema,
  /** In the piece's own plane, about its own origin: the centre of its box when it was brought in. */
  path: pathSchema,
  placement: placementSchema,
  /** What it reads as, a letter or a word; empty for what is no lettering. */
  reads: line,
});

export const locateSchema = z.enum(["pocket", "scored line", "template", "hole pattern", "none"]);

export const layerSchema = z.strictObject({
  key,
  name,
  stock: acrylicSchema,
  thickness: length.max(100),
  hold: holdSchema,
  locate: locateSchema,
  /** On which face the film is marked, so that no piece is laid face down. */
  marked: z.enum(["front", "back", "not stated"]),
  pieces: z.array(pieceSchema).max(2000),
  hidden: z.boolean(),
  /** Safe from the hand: its pieces and holes can be chosen and looked at, not moved or taken out. */
  locked: z.boolean(),
});

export const boardSchema = z.strictObject({
  /** Within width and height. A path is in mm on the board, its box the board's. */
  outline: z.discriminatedUnion("kind", [
    z.strictObject({ kind: z.literal("rectangle") }),
    z.strictObject({ kind: z.literal("rounded"), radius: length }),
    z.strictObject({ kind: z.literal("ellipse") }),
    z.strictObject({ kind: z.literal("path"), path: pathSchema.min(1) }),
  ]),
  /** Of the body, without a frame. */
  width: boardSide,
  height: boardSide,
  /** Which of the two the brief states. */
  measures: z.enum(["body", "overall"]),
});

/** Slats as shared/slats lays them; lengths mm, angles degrees. What can't be laid is a finding, not a refusal. */
export const slatsSchema = z.strictObject({
  stock: woodSchema,
  thickness: length.max(100),
  pattern: z.enum(["spine", "mitred", "single"]),
  /** Between slat and spine, or the upright where there is none. */
  angle: z.number().finite().min(15).max(90),
  slatWidth: length,
  gap: z.number().finite().min(0).max(longestMm),
  spineWidth: length,
  spineOffset: coordinate,
  start: z.discriminatedUnion("kind", [
    z.strictObject({ kind: z.literal("corner") }),
    z.strictObject({ kind: z.literal("height"), height: coordinate }),
  ]),
  direction: z.enum(["up", "down"]),
  overhang: z.number().finite().min(0).max(1000),
});

/** Round the body, its back level with the backer's. */
export const frameSchema = z.strictObject({
  stock: woodSchema,
  width: length.max(500),
  depth: length.max(500),
  /** In the corners: mitred, or butted with the uprights running through. */
  mitred: z.boolean(),
});

export const documentSchema = z
  .strictObject({
    version: z.literal(documentVersion),
    board: boardSchema,
    hanging: z.strictObject({
      kind: z.enum(["cleat", "keyholes", "wire", "screwed through", "through standoffs", "none"]),
      gap: z.number().finite().min(0).max(500),
      pose: z.enum(["upright", "tilted", "lying"]),
      /** What the shop states that the wall's fixing carries, kg; null until it does. */
      carriesKg: z.number().finite().positive().max(10_000).nullable(),
      /** Where the wall's fixings are, on the board. */
      points: z.array(point).max(50),
    }),
    quantity: z.int().min(1).max(1000),
    /** A plank, or under slats the substrate that they are glued on and screws bite in. */
    backer: z.strictObject({
      stock: woodSchema,
      thickness: length.max(200),
      /** The way the grain runs, degrees clockwise from the x axis. */
      grainTurn: z.number().finite().min(0).max(180),
      slats: slatsSchema.nullable(),
      /** Of what is seen: the plank, or the slats. */
      finish: z.array(coatSchema).max(12),
    }),
    frame: frameSchema.nullable(),
    /** From the wall outward. Key A is the backer's, layers start at B. */
    layers: z.array(layerSchema).max(60),
    /** Words set as pieces. What they were set with stays here, so that they can be set again. */
    lettering: z.array(letteringSchema).max(200),
    presentation: z.strictObject({
      wall: colour,
      /** The place itself, in whose picture the sign is shown; null for a plain wall. */
      photo: wallPhotoSchema.nullable(),
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
    const set = new Set(document.lettering.map(({ id }) => id));
    if (set.size < document.lettering.length)
      context.addIssue({ code: "custom", path: ["lettering"], message: "An id of lettering is used twice." });
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
      for (const { id, source } of layer.pieces)
        if (source.kind === "lettering" && !set.has(source.letteringId))
          context.addIssue({
            code: "custom",
            path: ["layers", index],
            message: `Piece ${id} is of lettering that is not there.`,
          });
    }
  });

export type MockupDocument = z.infer<typeof documentSchema>;
export type Layer = z.infer<typeof layerSchema>;
export type Piece = z.infer<typeof pieceSchema>;
export type Hold = z.infer<typeof holdSchema>;
export type Hole = z.infer<typeof holeSchema>;
export type Backer = MockupDocument["backer"];
export type Slats = z.infer<typeof slatsSchema>;
export type FrameOfSign = z.infer<typeof frameSchema>;
export type Board = z.infer<typeof boardSchema>;
export type Hardware = z.infer<typeof hardwareSchema>;
export type CapStud = z.infer<typeof capStudSchema>;
export type Screw = z.infer<typeof screwSchema>;
export type Coat = z.infer<typeof coatSchema>;
export type Acrylic = z.infer<typeof acrylicSchema>;
export type Wood = z.infer<typeof woodSchema>;
export type Adhesive = z.infer<typeof adhesiveSchema>;
export type Lettering = z.infer<typeof letteringSchema>;
export type PieceSource = z.infer<typeof pieceSourceSchema>;
export type WallPhoto = z.infer<typeof wallPhotoSchema>;
export type Locate = z.infer<typeof locateSchema>;
