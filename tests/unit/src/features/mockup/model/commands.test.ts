import { describe, expect, it } from "vitest";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import { bringInArtwork, type ColourChoice } from "@/features/mockup/model/commands/bring-in-artwork.ts";
import { addHole, fixHole, proposeHoles, removeHole, setHole } from "@/features/mockup/model/commands/holes.ts";
import { moveLayer, removeLayer } from "@/features/mockup/model/commands/order-layers.ts";
import {
  boxOfPieces,
  centrePieces,
  movePieces,
  placePiece,
  removePieces,
  scalePieces,
  turnPieces,
} from "@/features/mockup/model/commands/pieces.ts";
import { setBoard } from "@/features/mockup/model/commands/set-board.ts";
import { bondLayer, raiseLayer, standLayer } from "@/features/mockup/model/commands/set-hold.ts";
import { setLayer } from "@/features/mockup/model/commands/set-layer.ts";
import { barrel, brass, cement, chalk, emptyMockup, epoxy, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

const artworkId = "0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11";

/** A 275 mm disc on four standoffs in the middle of a 600 × 400 board. */
function discOnStandoffs(): MockupDocument {
  return addPlate(emptyMockup(), {
    shape: { kind: "circle", diameter: 275 },
    site: inside,
    id: "disc",
    name: "Night disc",
    stock: midnight,
    thickness: 4.5,
    hold: { kind: "standoff", hardware: barrel(19) },
  });
}

function holesOf(document: MockupDocument, index = 0) {
  const hold = document.layers[index]?.hold;
  return hold?.kind === "standoff" ? hold.holes : [];
}

const square = (index: number, colour: string, x: number, y: number, size: number) => ({
  index,
  colour,
  path: rectanglePath({ x, y, width: size, height: size }),
  box: { x, y, width: size, height: size },
  areaMm2: size * size,
});
const choice = (colour: string, fields: Partial<ColourChoice> = {}): ColourChoice => ({
  colour,
  name: colour,
  stock: brass,
  thickness: 3,
  hold: { kind: "bond", adhesive: cement },
  solid: false,
  ...fields,
});

describe("bringing in artwork", () => {
  const artwork = {
    artworkId,
    widthMm: 200,
    heightMm: 100,
    pieces: [square(0, "#111111", 0, 0, 40), square(1, "#EEEEEE", 150, 60, 20), square(2, "#111111", 60, 10, 10)],
  };

  it("puts a mark that lies in the corner of a large page on the middle of the board", () => {
    const { board } = emptyMockup();
    const page = { ...artwork, widthMm: 2000, heightMm: 2000, pieces: [square(0, "#111111", 0, 0, 40)] };
    const document = bringInArtwork(emptyMockup(), {
      artwork: page,
      choices: [choice("#111111")],
      site: inside,
      id: "in",
    });
    expect(document.layers[0]?.pieces[0]?.placement).toMatchObject({ x: board.width / 2, y: board.height / 2 });
  });

  it("makes a layer for each chosen colour, in the order chosen, with the artwork's middle on the board's", () => {
    const document = bringInArtwork(emptyMockup(), {
      artwork,
      choices: [choice("#EEEEEE"), choice("#111111"), choice("#999999")],
      site: inside,
      id: "in",
    });
    expect(document.layers.map(({ key, name, pieces }) => [key, name, pieces.length])).toEqual([
      ["B", "#EEEEEE", 1],
      ["C", "#111111", 2],
    ]);
    // The square of 40 at the upper left: its middle at 20, 20 of the artwork, which starts at 200, 150 of the board.
    expect(document.layers[1]?.pieces[0]?.placement).toEqual({ x: 220, y: 170, turn: 0, scale: 1, mirrored: false });
    expect(boxOfPieces(document, ["in-1"])).toEqual({ x: 200, y: 150, width: 40, height: 40 });
    expect(documentSchema.safeParse(document).success).toBe(true);
  });

  it("takes the next free keys, over gaps and without I and O", () => {
    let document = emptyMockup();
    for (let step = 0; step < 8; step++)
      document = bringInArtwork(document, { artwork, choices: [choice("#EEEEEE")], site: inside, id: `in${step}` });
    document = removeLayer(document, { key: "D" });
    document = bringInArtwork(document, {
      artwork,
      choices: [choice("#EEEEEE"), choice("#111111")],
      site: inside,
      id: "last",
    });
    expect(document.layers.map(({ key }) => key).join("")).toBe("BCEFGHJDK");
  });

  it("closes openings of a solid colour and leaves out what lay in them", () => {
    const plate = {
      ...square(0, "#111111", 0, 0, 100),
      path: [
        ...rectanglePath({ x: 0, y: 0, width: 100, height: 100 }),
        ...rectanglePath({ x: 20, y: 20, width: 60, height: 60 }),
      ],
    };
    const document = bringInArtwork(emptyMockup(), {
      artwork: { ...artwork, pieces: [plate, square(1, "#111111", 40, 40, 20)] },
      choices: [choice("#111111", { solid: true })],
      site: inside,
      id: "in",
    });
    expect(document.layers[0]?.pieces.map(({ path }) => path.length)).toEqual([1]);
  });
});

describe("adding a plate", () => {
  const plate = (nearest?: "wall" | "viewer") =>
    addPlate(discOnStandoffs(), {
      shape: { kind: "rectangle", width: 300, height: 120 },
      site: inside,
      id: "plate",
      name: " Ground ",
      stock: chalk,
      thickness: 3,
      hold: { kind: "bond", adhesive: epoxy },
      ...(nearest ? { nearest } : {}),
    });

  it("lays it under or over the layers there are, with the next free key", () => {
    expect(plate("wall").layers.map(({ key }) => key)).toEqual(["C", "B"]);
    expect(plate("viewer").layers.map(({ key }) => key)).toEqual(["B", "C"]);
    expect(plate().layers.map(({ key }) => key)).toEqual(["B", "C"]);
  });

  it("gives the plate the layer's name", () => {
    expect(plate().layers[1]).toMatchObject({ name: "Ground", pieces: [{ id: "plate", name: "Ground" }] });
  });
});

describe("changing a layer's stock", () => {
  it("changes a name that was only the stock's, and leaves one that somebody gave", () => {
    const document = discOnStandoffs();
    const named = setLayer(document, { key: "B", name: midnight.name });
    expect(setLayer(named, { key: "B", stock: brass }).layers[0]).toMatchObject({ name: "Brass", stock: brass });
    expect(setLayer(document, { key: "B", stock: brass }).layers[0]).toMatchObject({ name: "Night disc" });
  });
});

describe("changing the board's size", () => {
  it("keeps pieces and holes at their places from its middle", () => {
    const before = discOnStandoffs();
    const after = setBoard(before, { width: 630, height: 380 });
    expect(after.board).toMatchObject({ width: 630, height: 380 });
    expect(after.layers[0]?.pieces[0]?.placement).toMatchObject({ x: 315, y: 190 });
    expect(holesOf(after).map(({ x, y }) => [x, y])).toEqual(holesOf(before).map(({ x, y }) => [x + 15, y - 10]));
  });

  it("moves nothing when only the wood changes", () => {
    const before = discOnStandoffs();
    expect(setBoard(before, { thickness: 25 }).layers).toBe(before.layers);
  });
});

describe("holding a layer", () => {
  it("proposes four holes on a disc's diagonals, the first fixed and each other one with a window", () => {
    const holes = holesOf(discOnStandoffs());
    // 5 mm stud, half a millimetre a side: 6. A cap of 15 with 1 mm of cover hides up to 9, so a hole may move by 1.5 mm at
    // most. Across the grain of pine that is 1.5 / (7e-5 · 20 + 0.00212 · 4) = 151.8 mm from the fixed one, and the first
    // place on the way in from the corners that is near enough lies 75.625 mm off the middle. Movement: 0.212 along, 1.494
    // across and 1.206 mm on the diagonal; 1.494 leaves 8.99 to 9.
    expect(holes.map(({ x, y, fixed, diameter }) => [x - 300, y - 200, fixed, diameter])).toEqual([
      [-75.625, -75.625, true, 6],
      [75.625, -75.625, false, 7.7],
      [-75.625, 75.625, false, 9],
      [75.625, 75.625, false, 8.7],
    ]);
  });

  it("proposes holes as far out as the cap allows where the panel moves little", () => {
    const small = addPlate(emptyMockup(), {
      shape: { kind: "circle", diameter: 120 },
      site: inside,
      id: "disc",
      name: "Small disc",
      stock: midnight,
      thickness: 4.5,
      hold: { kind: "standoff", hardware: barrel(19) },
    });
    for (const { x, y } of holesOf(small)) {
      const fromMiddle = Math.hypot(x - 300, y - 200);
      expect(fromMiddle).toBeGreaterThan(39);
      // Centre at least two hole diameters from the edge.
      expect(fromMiddle).toBeLessThanOrEqual(60 - 18);
    }
  });

  it("proposes the outermost holes where no place gives every one a window", () => {
    const thin = { ...barrel(19), capDiameter: 7, barrelDiameter: 7 };
    // A cap of 7 over a 5 mm stud hides up to 5 mm: no hole with play can hide, wherever it is.
    const holes = holesOf(
      standLayer(bondLayer(discOnStandoffs(), { key: "B", adhesive: epoxy }), {
        key: "B",
        hardware: thin,
        site: inside,
        id: "h",
      }),
    );
    expect(holes).toHaveLength(4);
    for (const { x, y } of holes) expect(Math.hypot(x - 300, y - 200)).toBeGreaterThan(115);
  });

  it("goes from bond to standoffs and back, changing how the place is found", () => {
    const bonded = addPlate(emptyMockup(), {
      shape: { kind: "rectangle", width: 200, height: 80 },
      site: inside,
      id: "plate",
      name: " Lettering ",
      stock: chalk,
      thickness: 3,
      hold: { kind: "bond", adhesive: cement },
    });
    expect(bonded.layers[0]).toMatchObject({ name: "Lettering", locate: "none" });
    const stood = standLayer(bonded, { key: "B", hardware: barrel(25), site: inside, id: "h" });
    expect(stood.layers[0]).toMatchObject({ locate: "hole pattern", hold: { kind: "standoff", offset: 25 } });
    expect(holesOf(stood)).toHaveLength(4);
    const other = standLayer(stood, { key: "B", hardware: barrel(12), site: inside, id: "again" });
    expect(holesOf(other)).toBe(holesOf(stood));
    expect(other.layers[0]?.hold).toMatchObject({ offset: 12 });
    const back = bondLayer(other, { key: "B", adhesive: epoxy });
    expect(back.layers[0]).toMatchObject({ locate: "none", hold: { kind: "bond", adhesive: epoxy } });
  });

  it("raises a standoff layer with the hardware it caught on, and a bonded one not at all", () => {
    const raised = raiseLayer(discOnStandoffs(), { key: "B", offset: 25, hardware: barrel(25) });
    expect(raised.layers[0]?.hold).toMatchObject({ offset: 25, hardware: { barrelLength: 25 } });
    const free = raiseLayer(raised, { key: "B", offset: 21.2 });
    expect(free.layers[0]?.hold).toMatchObject({ offset: 21.2, hardware: { barrelLength: 25 } });
    const bonded = bondLayer(raised, { key: "B", adhesive: epoxy });
    expect(raiseLayer(bonded, { key: "B", offset: 25 })).toBe(bonded);
  });

  it("adds, moves, fixes and removes holes, always with one fixed", () => {
    let document = addHole(discOnStandoffs(), { key: "B", site: inside, id: "fifth", x: 300, y: 200 });
    document = setHole(document, { holeId: "fifth", x: 310.5, diameter: 8 });
    expect(holesOf(document)[4]).toEqual({ id: "fifth", x: 310.5, y: 200, diameter: 8, fixed: false });
    document = fixHole(document, { holeId: "fifth" });
    expect(holesOf(document).filter(({ fixed }) => fixed)).toHaveLength(1);
    document = removeHole(document, { holeId: "fifth" });
    expect(holesOf(document).map(({ fixed }) => fixed)).toEqual([true, false, false, false]);
    expect(removeHole(document, { holeId: "fifth" })).toBe(document);
    expect(holesOf(proposeHoles(document, { key: "B", site: inside, id: "new" })).map(({ id }) => id)).toEqual([
      "new-1",
      "new-2",
      "new-3",
      "new-4",
    ]);
  });
});

describe("pieces", () => {
  const two = () =>
    addPlate(discOnStandoffs(), {
      shape: { kind: "rectangle", width: 60, height: 20 },
      site: inside,
      id: "bar",
      name: "Bar",
      stock: brass,
      thickness: 3,
      hold: { kind: "bond", adhesive: cement },
    });

  it("take their standoff holes along", () => {
    const before = holesOf(two());
    const document = movePieces(two(), { pieceIds: ["disc"], dx: 12.5, dy: -3 });
    expect(document.layers[0]?.pieces[0]?.placement).toMatchObject({ x: 312.5, y: 197 });
    expect(holesOf(document)[0]).toMatchObject({ x: (before[0]?.x ?? 0) + 12.5, y: (before[0]?.y ?? 0) - 3 });
    expect(document.layers[1]).toEqual(two().layers[1]);
  });

  it("turn and grow together about their middle", () => {
    const placed = placePiece(two(), { pieceId: "bar", x: 100, y: 50, turn: 90 });
    expect(boxOfPieces(placed, ["bar"])).toMatchObject({ width: expect.closeTo(20, 6), height: expect.closeTo(60, 6) });
    const grown = scalePieces(placed, { pieceIds: ["bar"], by: 1.5 });
    expect(grown.layers[1]?.pieces[0]?.placement).toEqual({ x: 100, y: 50, turn: 90, scale: 1.5, mirrored: false });
    const turned = turnPieces(placed, { pieceIds: ["bar"], by: -90, about: { x: 0, y: 0 } });
    expect(turned.layers[1]?.pieces[0]?.placement).toMatchObject({ x: 50, y: -100, turn: 0 });
  });

  it("centre on the board one way or both", () => {
    const placed = placePiece(two(), { pieceId: "bar", x: 100, y: 50 });
    const place = (way: "across" | "down" | "both") =>
      centrePieces(placed, { pieceIds: ["bar"], way }).layers[1]?.pieces[0]?.placement;
    expect(place("across")).toMatchObject({ x: 300, y: 50 });
    expect(place("down")).toMatchObject({ x: 100, y: 200 });
    expect(place("both")).toMatchObject({ x: 300, y: 200 });
  });

  it("go with the holes in them when removed", () => {
    const document = removePieces(two(), { pieceIds: ["disc"] });
    expect(document.layers[0]?.pieces).toEqual([]);
    expect(holesOf(document)).toEqual([]);
  });
});

describe("what changes nothing gives the same document", () => {
  const document = discOnStandoffs();
  it.each<[string, MockupDocument]>([
    ["a move by nothing", movePieces(document, { pieceIds: ["disc"], dx: 0, dy: 0 })],
    ["a move by no number", movePieces(document, { pieceIds: ["disc"], dx: Number.NaN, dy: 1 })],
    ["a move of pieces that are not there", movePieces(document, { pieceIds: ["gone"], dx: 5, dy: 5 })],
    ["a whole turn", turnPieces(document, { pieceIds: ["disc"], by: 720 })],
    ["centring what is centred", centrePieces(document, { pieceIds: ["disc"], way: "both" })],
    ["the same name with blanks", setLayer(document, { key: "B", name: "  Night disc " })],
    ["an empty name", setLayer(document, { key: "B", name: " " })],
    ["a thickness over 100 mm", setLayer(document, { key: "B", thickness: 101 })],
    ["the same hardware", standLayer(document, { key: "B", hardware: barrel(19), site: inside, id: "x" })],
    ["the same offset", raiseLayer(document, { key: "B", offset: 19 })],
    ["moving the last layer to the viewer", moveLayer(document, { key: "B", towards: "viewer" })],
    ["removing a layer that is not there", removeLayer(document, { key: "Z" })],
    ["a board of no width", setBoard(document, { width: 0 })],
    ["half a sign", setBoard(document, { quantity: 1.5 })],
    ["light from below the wall plane", setBoard(document, { light: { azimuth: 0, elevation: 5, angularSize: 0 } })],
    [
      "a plate of no size",
      addPlate(document, {
        shape: { kind: "circle", diameter: 0 },
        site: inside,
        id: "p",
        name: "P",
        stock: brass,
        thickness: 3,
        hold: { kind: "bond", adhesive: cement },
      }),
    ],
  ])("%s", (_, after) => {
    expect(after).toBe(document);
  });
});

describe("the order of layers", () => {
  it("changes places and keeps keys", () => {
    const document = addPlate(discOnStandoffs(), {
      shape: { kind: "circle", diameter: 40 },
      site: inside,
      id: "sun",
      name: "Sun",
      stock: brass,
      thickness: 3,
      hold: { kind: "bond", adhesive: cement },
    });
    expect(moveLayer(document, { key: "B", towards: "viewer" }).layers.map(({ key }) => key)).toEqual(["C", "B"]);
    expect(moveLayer(document, { key: "C", towards: "wall" }).layers.map(({ key }) => key)).toEqual(["C", "B"]);
  });
});
