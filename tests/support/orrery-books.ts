import { createRequire } from "node:module";
import * as fontkit from "fontkit";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { boxCentre, boxOfPath, boxUnion } from "#shared/geometry/box.ts";
import type { Path, Placement, Point, Ring, Segment } from "#shared/geometry/path.ts";
import { circlePath } from "#shared/geometry/shapes.ts";
import { pathTransform, translateMatrix } from "#shared/geometry/transform.ts";
import {
  type Acrylic,
  type CapStud,
  documentSchema,
  type Layer,
  type MockupDocument,
} from "#shared/mockup/document.ts";
import type { FrozenNote, TitleBlock } from "#shared/mockup/snapshot.ts";

/** An invented shop sign, rich enough to exercise the whole drawing: a disc on standoffs, rings and planets on it, letters on the board. */

const require = createRequire(import.meta.url);

function openBlack(): fontkit.Font {
  const opened = fontkit.openSync(require.resolve("@fontsource/merriweather/files/merriweather-latin-900-normal.woff"));
  if (!("layout" in opened)) throw new Error("The lettering's file holds a collection of fonts.");
  return opened;
}

/** TrueType outlines are quadratic; a cubic with c1 = p + 2/3 (q − p) and c2 = p′ + 2/3 (q − p′) is the same curve. */
function pathOfGlyph(glyph: fontkit.Glyph, at: Point, scale: number): Path {
  const rings: Ring[] = [];
  let segments: Segment[] = [];
  let from: Point = at;
  const place = (x: number, y: number): Point => ({ x: at.x + x * scale, y: at.y - y * scale });
  const towards = (p: Point, q: Point): Point => ({ x: p.x + ((q.x - p.x) * 2) / 3, y: p.y + ((q.y - p.y) * 2) / 3 });
  for (const { command, args } of glyph.path.commands) {
    const [x1 = 0, y1 = 0, x2 = 0, y2 = 0] = args;
    if (command === "moveTo") {
      from = place(x1, y1);
      segments = [];
      rings.push({ start: from, segments });
    } else if (command === "lineTo") {
      from = place(x1, y1);
      segments.push({ kind: "line", to: from });
    } else if (command === "quadraticCurveTo") {
      const control = place(x1, y1);
      const to = place(x2, y2);
      segments.push({ kind: "cubic", c1: towards(from, control), c2: towards(to, control), to });
      from = to;
    }
  }
  return rings;
}

function letters(text: string, capHeight: number, middle: Point): Path[] {
  const font = openBlack();
  const scale = capHeight / font.capHeight;
  const { glyphs, positions } = font.layout(text);
  let x = 0;
  const paths = glyphs.map((glyph, index) => {
    const path = pathOfGlyph(glyph, { x, y: 0 }, scale);
    // Cut letters stand a little wider than set ones, so that shadows don't close the gaps.
    x += (positions[index]?.xAdvance ?? 0) * scale + capHeight * 0.06;
    return path;
  });
  const shown = paths.filter((path) => path.length > 0);
  const box = boxUnion(shown.map(boxOfPath));
  if (!box) return [];
  const centre = boxCentre(box);
  return shown.map((path) => pathTransform(path, translateMatrix(middle.x - centre.x, middle.y - centre.y)));
}

/** A piece as it is brought in: its path about the middle of its own box. */
function pieceOf(id: string, name: string, path: Path, colour: string): Layer["pieces"][number] {
  const centre = boxCentre(boxOfPath(path) ?? { x: 0, y: 0, width: 0, height: 0 });
  const placement: Placement = { x: centre.x, y: centre.y, turn: 0, scale: 1, mirrored: false };
  return {
    id,
    name,
    source: { kind: "artwork", artworkId: "6f1d3a52-8f0e-4c0b-9a51-0d3c5c1b7a10", index: 0, colour },
    path: [...pathTransform(path, translateMatrix(-centre.x, -centre.y))].map((ring) => ({
      start: ring.start,
      segments: [...ring.segments],
    })),
    placement,
    reads: "",
  };
}

function acrylic(name: string, colour: string, look: Acrylic["look"] = "opaque"): Acrylic {
  return { kind: "acrylic", stockId: null, name, colour, look, process: "cast", facesDiffer: false, densityKgM3: 1190 };
}

const capStud: CapStud = {
  kind: "capStud",
  stockId: null,
  name: "Standoff 15 × 19, brushed",
  finish: "#C9C6BF",
  barrelDiameter: 15,
  barrelLength: 19,
  boreDiameter: 9,
  boreDepth: 16,
  floorThickness: 3,
  floorHole: 4,
  countersunk: false,
  studDiameter: 6,
  studLength: 12,
  capDiameter: 18,
  capThickness: 4,
  screw: {
    name: "No. 6 × 16 pan head",
    gauge: 6,
    head: "pan",
    diameter: 3.5,
    length: 16,
    headDiameter: 6.9,
    headHeight: 2.1,
  },
};

const bond: Layer["hold"] = {
  kind: "bond",
  adhesive: { stockId: null, name: "Thick cyanoacrylate", family: "cyanoacrylate" },
  tack: null,
};
const cement: Layer["hold"] = {
  kind: "bond",
  adhesive: { stockId: null, name: "Bodied acrylic cement", family: "bodied cement" },
  tack: null,
};

const middle: Point = { x: 300, y: 160 };
const turned = (radius: number, degrees: number): Point => ({
  x: middle.x + radius * Math.cos((degrees * Math.PI) / 180),
  y: middle.y + radius * Math.sin((degrees * Math.PI) / 180),
});
type Planet = { readonly at: number; readonly radius: number };
const rust: Planet = { at: 158, radius: 12 };
const outer: Planet = { at: -24, radius: 13 };
const moon: Planet = { at: 204, radius: 9 };

/** A ring that is cut where planets lie, 0.3 mm off them, so that they lie on the disc and not on its edge. */
function ring(radius: number, width: number, planets: readonly Planet[]): Path {
  const gaps = planets
    .map((planet) => ({ ...planet, half: (360 / Math.PI) * Math.asin((planet.radius + 0.3) / (2 * radius)) }))
    .toSorted((a, b) => a.at - b.at);
  if (gaps.length === 0) return [...circlePath(middle, radius + width / 2), ...circlePath(middle, radius - width / 2)];
  return gaps.map(({ at, half }, index) => {
    const next = gaps[index + 1] ?? gaps[0];
    const end = next && (next.at > at ? next.at : next.at + 360) - next.half;
    return band(radius, width, at + half, end ?? at + half);
  });
}

/** A piece of a ring between two directions in degrees. */
function band(radius: number, width: number, from: number, to: number): Ring {
  const [wide, narrow] = [radius + width / 2, radius - width / 2];
  const back = arc(narrow, to, from);
  return {
    start: turned(wide, from),
    segments: [
      ...arc(wide, from, to),
      { kind: "line", to: turned(narrow, to) },
      ...back,
      { kind: "line", to: turned(wide, from) },
    ],
  };
}

/** An arc of cubics of 45° at the most; the handles are 4/3 tan(angle/4) of the radius. */
function arc(radius: number, from: number, to: number): Segment[] {
  const count = Math.ceil(Math.abs(to - from) / 45);
  const step = (to - from) / count;
  const handle = (4 / 3) * Math.tan((step * Math.PI) / 720) * radius;
  return Array.from({ length: count }, (_, index): Segment => {
    const [start, end] = [from + index * step, from + (index + 1) * step];
    const along = (degrees: number, sign: 1 | -1): Point => {
      const [on, radians] = [turned(radius, degrees), (degrees * Math.PI) / 180];
      return { x: on.x - sign * handle * Math.sin(radians), y: on.y + sign * handle * Math.cos(radians) };
    };
    return { kind: "cubic", c1: along(start, 1), c2: along(end, -1), to: turned(radius, end) };
  });
}

function layer(
  key: string,
  name: string,
  stock: Acrylic,
  thickness: number,
  rest: Pick<Layer, "hold" | "locate" | "pieces">,
): Layer {
  return { key, name, stock, thickness, marked: "back", hidden: false, locked: false, ...rest };
}

/** The document of "Orrery Books": a pine board of 600 by 400 mm, layers B to G. Fresh at every call. */
export function orreryBooks(): MockupDocument {
  const navy = "#27304F";
  const brass = "#C79A3A";
  const holes = [45, 135, 225, 315].map((degrees, index) => {
    const { x, y } = turned(113, degrees);
    return {
      id: `h${index + 1}`,
      x: Math.round(x * 10) / 10,
      y: Math.round(y * 10) / 10,
      diameter: index === 0 ? 8 : 8.4,
      fixed: index === 0,
    };
  });
  const planet = (id: string, name: string, at: Point, radius: number, colour: string) =>
    pieceOf(id, name, circlePath(at, radius), colour);
  return documentSchema.parse({
    version: 4,
    board: { outline: { kind: "rectangle" }, width: 600, height: 400, measures: "body" },
    hanging: { kind: "cleat", gap: 6, pose: "upright", carriesKg: 20, points: [] },
    quantity: 1,
    backer: {
      stock: {
        kind: "wood",
        stockId: null,
        name: "Eastern white pine, quartersawn",
        colour: "#E6D3AC",
        gravity: 0.35,
        moisturePercent: 9,
        hardness: "softwood",
        movementPerPoint: 0.00071,
      },
      thickness: 20,
      grainTurn: 0,
      slats: null,
      finish: [
        { kind: "stain", name: "Pale wash", colour: "#F2E9D8", strength: 0.25, dryingHours: 6 },
        { kind: "clear coat", name: "Clear satin", base: "water-borne", dryingHours: 2 },
        { kind: "clear coat", name: "Clear satin", base: "water-borne", dryingHours: 12 },
      ],
    },
    frame: null,
    layers: [
      layer("B", "Night disc", acrylic("Midnight, gloss", navy), 4.5, {
        hold: { kind: "standoff", hardware: capStud, offset: 19, holes },
        locate: "hole pattern",
        pieces: [pieceOf("disc", "Disc", circlePath(middle, 130), navy)],
      }),
      layer("C", "Orbits", acrylic("Brass, satin", brass), 3, {
        hold: cement,
        locate: "template",
        pieces: [ring(98, 5, [outer, moon]), ring(70, 5, [rust]), ring(42, 5, [])].map((path, index) =>
          pieceOf(`ring-${index + 1}`, `Orbit ${index + 1}`, path, brass),
        ),
      }),
      layer("D", "Sun", acrylic("Amber, gloss", "#E8B64C"), 3, {
        hold: cement,
        locate: "template",
        pieces: [planet("sun", "Sun", middle, 23, "#E8B64C")],
      }),
      layer("E", "Rust planet", acrylic("Rust, matt", "#B14E3C"), 3, {
        hold: cement,
        locate: "scored line",
        pieces: [planet("planet-rust", "Rust planet", turned(70, rust.at), rust.radius, "#B14E3C")],
      }),
      layer("F", "Chalk planets", acrylic("Chalk, matt", "#F3EEE6"), 3, {
        hold: cement,
        locate: "scored line",
        pieces: [
          planet("planet-chalk-1", "Outer planet", turned(98, outer.at), outer.radius, "#F3EEE6"),
          planet("planet-chalk-2", "Outer moon", turned(98, moon.at), moon.radius, "#F3EEE6"),
        ],
      }),
      layer("G", "Lettering", acrylic("Midnight, gloss", navy), 4.5, {
        hold: bond,
        locate: "template",
        pieces: letters("ORRERY BOOKS", 44, { x: 300, y: 342 }).map((path, index) =>
          pieceOf(`letter-${index + 1}`, `Letter ${index + 1}`, path, navy),
        ),
      }),
    ],
    lettering: [],
    presentation: {
      photo: null,
      wall: "#EFE8DC",
      light: { azimuth: 320, elevation: 52, angularSize: 0.22 },
      viewingDistance: 6000,
    },
  } satisfies MockupDocument);
}

export const orreryTitleBlock: TitleBlock = {
  owner: "Copperlark Signs",
  client: "Orrery Books",
  title: "Lobby sign, rings and planets",
  number: "CL-0142",
  revision: "B",
  date: "2026-11-30",
  createdBy: "Ada Fenn, bench 1",
  documentType: "Proof drawing",
  unit: "mm",
};

export const orreryNotes: readonly FrozenNote[] = [
  {
    number: 1,
    kind: "must change",
    state: "answered",
    text: "Can the gold ring be a little wider? It gets lost from the door.",
    author: "Tilda Marsh",
    fromRevision: "A",
    zone: "B3",
  },
  {
    number: 2,
    kind: "question",
    state: "open",
    text: "Will the caps be brushed or polished?",
    author: "Tilda Marsh",
    fromRevision: "A",
    zone: "B3",
  },
  {
    number: 3,
    kind: "fine as is",
    state: "settled",
    text: "Letters read “Orrery Books”, no ampersand.",
    author: "Tilda Marsh",
    fromRevision: "A",
    zone: null,
  },
];

export const orreryFindings: readonly Finding[] = [
  {
    rule: 3,
    title: "Thin stroke",
    severity: "caution",
    text: "The thinnest stroke of Orbit 3 is 2.6 mm; 3 mm is advised for a 3 mm sheet that stands free.",
    layerKey: "C",
    pieceIds: ["ring-3"],
    holeId: null,
    where: { x: 300, y: 118 },
    value: 2.6,
    limit: 3,
    unit: "mm",
    source: "common practice",
  },
  {
    rule: 20,
    title: "Locate",
    severity: "caution",
    text: "The chalk planets have no template. Say how the hand finds their place.",
    layerKey: "F",
    pieceIds: ["planet-chalk-1", "planet-chalk-2"],
    holeId: null,
    where: { x: 390, y: 120 },
    value: null,
    limit: null,
    unit: null,
    source: "our choice",
  },
];
