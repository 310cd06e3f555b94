import { describe, expect, it } from "vitest";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { type AnotherLike, anotherLike } from "#shared/mockup/another-like.ts";
import { documentSchema, type MockupDocument, type Piece } from "#shared/mockup/document.ts";
import version4 from "../../../fixtures/documents/version-4.json" with { type: "json" };
import { buildHardware, buildLayer, buildSign, disc, hole, plate, standoffHold } from "../../../support/build-sign.ts";

const logo = "0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11";
const mark = "6f1d3a52-8f0e-4c0b-9a51-0d3c5c1b7a10";

/** Each outline has a measure of its own that stands nowhere else, so that any of them would be found again. */
const heron = plate("heron-id", 41.731, 30, [120, 200], {
  name: "Heron",
  source: { kind: "artwork", artworkId: logo, index: 3, colour: "#27314F" },
});
const halo = plate("halo-id", 47.913, 36, [120, 200], {
  name: "Halo",
  source: { kind: "margin", margin: 3.177, corners: "round", artworkIds: [logo] },
});
const joined = plate("joined-id", 53.377, 20, [200, 100], {
  name: "Reeds",
  source: { kind: "worked", how: "joined", artworkIds: [logo, mark] },
});
const wordsHalo = plate("words-halo-id", 61.553, 20, [300, 300], {
  source: { kind: "margin", margin: 4.211, corners: "sharp", artworkIds: [] },
});
const letter = plate("letter-id", 11.639, 17, [320, 300], {
  name: "H of HERON",
  source: { kind: "lettering", letteringId: "set-id", letter: 0, laid: { x: 5.407, y: 0, turn: 0 } },
  reads: "H",
});
const disguised: Piece = plate("disguised-id", 10, 10, [400, 300], {
  path: [
    ...rectanglePath({ x: -5, y: -5, width: 10, height: 10 }),
    ...rectanglePath({ x: 1.283, y: 0, width: 2, height: 2 }),
  ].map(({ start, segments }) => ({ start, segments: [...segments] })),
});
const round = disc("round-id", 90, [150, 200], { name: "Heron disc", reads: "HERON" });
const edge = plate("edge-id", 100, 40, [480, 200], { name: "Base" });

const outline = rectanglePath({ x: 0.649, y: 0, width: 599.351, height: 400 }).map(({ start, segments }) => ({
  start,
  segments: [...segments],
}));

const source: MockupDocument = buildSign(
  [
    buildLayer("B", [round, heron, edge], {
      name: "Heron & Weir ground",
      hold: standoffHold([
        hole("hole-in-disc", 100, 150, { diameter: 8.4 }),
        hole("hole-in-heron", 236, 118, { fixed: true }),
        hole("hole-in-edge", 475, 195),
      ]),
      thickness: 5,
      locked: true,
    }),
    buildLayer("C", [halo, joined], {
      name: "Halo",
      hold: standoffHold([hole("hole-in-halo", 120, 200, { fixed: true })], buildHardware("throughScrew")),
      hidden: true,
    }),
    buildLayer("D", [wordsHalo, letter, disguised], { name: "Midnight words" }),
    buildLayer("E", [], { hold: standoffHold([hole("hole-alone", 120, 200, { fixed: true })]) }),
  ],
  {
    board: { outline: { kind: "path", path: outline }, width: 600, height: 400, measures: "overall" },
    hanging: { kind: "cleat", gap: 8, pose: "tilted", carriesKg: 37, points: [{ x: 150, y: 40 }] },
    quantity: 3,
    lettering: version4.lettering.slice(0, 1).map((set) => ({
      ...(set as MockupDocument["lettering"][number]),
      id: "set-id",
      words: "HERON & WEIR",
    })),
    presentation: {
      wall: "#A1B2C3",
      photo: {
        photoId: "7c0dbe0a-9a9c-4c1c-8f53-7f4f0f6a1d22",
        widthPx: 1000,
        heightPx: 800,
        paper: "A4",
        lies: "upright",
        corners: [
          { x: 100, y: 100 },
          { x: 200, y: 100 },
          { x: 200, y: 240 },
          { x: 100, y: 240 },
        ],
        at: { x: 0, y: 0 },
      },
      light: { azimuth: 300, elevation: 40, angularSize: 0.1 },
      viewingDistance: 7000,
    },
  },
);

const ids = () => {
  let next = 0;
  return () => {
    next += 1;
    return `new-${next}`;
  };
};
const words = ["Lobby sign", "Kingfisher Books", "HERON & WEIR"];
const like = (options: Partial<AnotherLike> = {}, document = source) =>
  anotherLike(document, { sameClient: false, artwork: null, words, newId: ids(), ...options });

/** All that identifies or follows the first client's work: no text of it, no id, no measure of an outline. */
const theirs = [
  ...["heron", "halo", "joined", "words-halo", "letter", "disguised", "round", "edge", "set"].map(
    (name) => `${name}-id`,
  ),
  ...["hole-in-disc", "hole-in-heron", "hole-in-edge", "hole-in-halo", "hole-alone"],
  ...[logo, mark, "7c0dbe0a-9a9c-4c1c-8f53-7f4f0f6a1d22"],
  ...["Heron", "HERON", "WEIR", "Halo", "Reeds", "words", "Base", "A1B2C3", '"carriesKg":37'],
  // Half of each width, as the outline has it.
  ...["20.8655", "23.9565", "26.6885", "30.7765", "5.8195", "1.283", "0.649", "3.177", "4.211", "5.407"],
];

describe("another like this for another client", () => {
  it("has nothing that the first client gave or that follows from it, wherever in the document", () => {
    const before = JSON.stringify(source);
    for (const text of theirs) expect(before).toContain(text === "words" ? "Midnight words" : text);
    for (const asked of [{}, { artwork: new Map([[logo, "5e8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11"]]) }]) {
      const made = like(asked);
      expect(documentSchema.safeParse(made).error?.issues ?? []).toEqual([]);
      const after = JSON.stringify(made);
      for (const text of theirs) expect(after.replace('"lettering"', "").includes(text), text).toBe(false);
    }
    expect(JSON.stringify(source)).toBe(before);
  });

  it("has the same format, stack and hardware, its plates, and the holes that are in them", () => {
    const made = like();
    expect(made.board).toEqual({ outline: { kind: "rectangle" }, width: 600, height: 400, measures: "overall" });
    expect(made.hanging).toEqual({ ...source.hanging, carriesKg: null });
    expect(made.quantity).toBe(3);
    expect(made.backer).toEqual(source.backer);
    expect(made.presentation).toEqual({
      wall: "#EFE9DC",
      photo: null,
      light: source.presentation.light,
      viewingDistance: 7000,
    });
    expect(made.layers.map(({ key, name, thickness, hold }) => [key, name, thickness, hold.kind])).toEqual([
      ["B", "Layer B", 5, "standoff"],
      ["C", "Layer C", 3, "standoff"],
      ["D", "Layer D", 3, "bond"],
      ["E", "Layer E", 3, "standoff"],
    ]);
    const [ground, halos, lettered] = made.layers;
    expect(ground?.pieces.map(({ name, reads, path, placement }) => ({ name, reads, path, placement }))).toEqual([
      { name: "Plate", reads: "", path: round.path, placement: round.placement },
      { name: "Plate", reads: "", path: edge.path, placement: edge.placement },
    ]);
    // In the box of the disc, and not in the disc.
    expect(made.layers[0]?.hold.kind === "standoff" && made.layers[0].hold.holes.some(({ y }) => y === 118)).toBe(
      false,
    );
    // Of the fixed hole's piece nothing came, so the first hole that did is the fixed one.
    expect(ground?.hold).toMatchObject({
      offset: 12,
      holes: [
        { x: 100, y: 150, diameter: 8.4, fixed: true },
        { x: 475, y: 195, diameter: 8, fixed: false },
      ],
    });
    expect(halos).toMatchObject({ pieces: [], hidden: false, hold: { hardware: { kind: "throughScrew" }, holes: [] } });
    expect(lettered).toMatchObject({ pieces: [], locked: false });
    // Nothing says what a hole was for in which no piece is.
    expect(made.layers[3]?.hold).toMatchObject({ holes: [] });
  });

  it("keeps a layer's name where it is only its sheet's, and all slats, frame and finish of the kept sample", () => {
    const sample = documentSchema.parse(version4);
    const [first] = sample.layers;
    const named = { ...sample, layers: first ? [{ ...first, name: first.stock.name }] : [], lettering: [] };
    const made = like({}, named);
    expect(made.layers[0]?.name).toBe("Midnight");
    expect(made).toMatchObject({ frame: sample.frame, backer: sample.backer, board: sample.board });
    const hold = first?.hold.kind === "standoff" ? first.hold.holes : [];
    const kept = made.layers[0]?.hold.kind === "standoff" ? made.layers[0].hold.holes : [];
    expect(kept.map(({ id, ...rest }) => rest)).toEqual(hold.map(({ id, ...rest }) => rest));
    expect(kept.map(({ id }) => id)).toEqual(["new-2", "new-3"]);
  });
});

describe("another like this for the same client", () => {
  it("without the artwork leaves the same out, and keeps names that carry no word of the old sign", () => {
    const made = like({ sameClient: true });
    const after = JSON.stringify(made);
    for (const text of [logo, mark, "heron-id", "20.8655", "0.649", "HERON", "Heron"])
      expect(after).not.toContain(text);
    expect(made.layers.map(({ name }) => name)).toEqual(["Layer B", "Halo", "Midnight words", "Layer E"]);
    expect(made.layers[0]?.pieces.map(({ name }) => name)).toEqual(["Plate", "Base"]);
  });

  it("takes the artwork along when asked, as the new job's own, with what was made of it and the board cut to it", () => {
    const copy = "5e8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11";
    const made = like({ sameClient: true, artwork: new Map([[logo, copy]]) });
    expect(documentSchema.safeParse(made).success).toBe(true);
    expect(made.board).toEqual(source.board);
    const [ground, halos, lettered] = made.layers;
    expect(ground?.pieces.map(({ source: from }) => from)).toEqual([
      { kind: "plate" },
      { kind: "artwork", artworkId: copy, index: 3, colour: "#27314F" },
      { kind: "plate" },
    ]);
    expect(ground?.hold.kind === "standoff" && ground.hold.holes).toHaveLength(3);
    expect(halos?.pieces.map(({ source: from }) => ("artworkIds" in from ? from.artworkIds : []))).toEqual([
      [copy],
      // What was no longer on the first job's list goes back to where it was.
      [copy, mark],
    ]);
    // Letters go, and what follows their outlines.
    expect(lettered?.pieces).toEqual([]);
    expect(made.presentation.photo).toBeNull();
  });
});
