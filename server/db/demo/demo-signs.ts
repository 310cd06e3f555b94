import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import {
  board,
  bondToAcrylic,
  bondToWood,
  clearCoat,
  disc,
  fourStandoffs,
  hardOil,
  layer,
  paleWash,
  piecesOfColour,
  reading,
  slatted,
  standoff,
} from "./demo-mockup.ts";

export type DemoArtwork = { readonly artworkId: string; readonly pieces: readonly ArtworkPiece[] };

/** Night disc on four standoffs, rings and planets bonded to it, lettering on the board. `wider` is what the client asked for. */
export function orrerySign(artwork: DemoArtwork, { ringThickness }: { ringThickness: number }): MockupDocument {
  const on = { ...artwork, at: { x: 40, y: 38 } };
  const middle = { x: 300, y: 150 };
  return {
    ...slatted(board({ width: 600, height: 400, wood: "Eastern white pine", thickness: 18, finish: paleWash }), {
      thickness: 6,
      slatWidth: 38,
      substrate: 15,
    }),
    layers: [
      layer({
        key: "B",
        name: "Night disc",
        stock: "Midnight",
        thickness: 4.5,
        hold: fourStandoffs(standoff("Standoff 19 × 19"), { ...middle, reach: 76, diameter: 11 }),
        pieces: [disc("night-disc", "Night disc", { ...middle, radius: 132 })],
      }),
      layer({
        key: "C",
        name: "Rings",
        stock: "Brass",
        thickness: ringThickness,
        hold: bondToAcrylic,
        pieces: piecesOfColour(on, "#C8992F", "Ring"),
      }),
      layer({
        key: "D",
        name: "Pale planets",
        stock: "Chalk",
        thickness: 3,
        hold: bondToAcrylic,
        pieces: piecesOfColour(on, "#F4EFE4", "Pale planet"),
      }),
      layer({
        key: "E",
        name: "Red planet",
        stock: "Rust",
        thickness: 3,
        hold: bondToAcrylic,
        pieces: piecesOfColour(on, "#B4523B", "Red planet"),
      }),
      layer({
        key: "F",
        name: "Green planet",
        stock: "Sage",
        thickness: 3,
        hold: bondToAcrylic,
        pieces: piecesOfColour(on, "#86A796", "Green planet"),
      }),
      layer({
        key: "G",
        name: "Sun",
        stock: "Marigold",
        thickness: 3,
        hold: bondToAcrylic,
        pieces: piecesOfColour(on, "#E8B84A", "Sun"),
      }),
      layer({
        key: "H",
        name: "Lettering",
        stock: "Midnight",
        thickness: 4.5,
        hold: bondToWood,
        pieces: reading("ORRERY BOOKS", piecesOfColour(on, "#27314F", "Letter")),
      }),
    ],
  };
}

/** Crossed oars and the club's name, all bonded to the board. */
export function oarsSign(artwork: DemoArtwork, { width }: { width: number }): MockupDocument {
  const on = { ...artwork, at: { x: (width - 420) / 2, y: 40 } };
  return {
    ...board({ width, height: 360, wood: "Red oak", thickness: 20, finish: hardOil }),
    layers: [
      layer({
        key: "B",
        name: "Oars",
        stock: "Harbour",
        thickness: 4.5,
        hold: bondToWood,
        pieces: piecesOfColour(on, "#34416B", "Piece"),
      }),
      layer({
        key: "C",
        name: "Ball",
        stock: "Brick",
        thickness: 6,
        hold: bondToWood,
        pieces: piecesOfColour(on, "#96372B", "Ball"),
      }),
    ],
  };
}

/** A small plate: letters bonded to a board. */
export function rackSign(artwork: DemoArtwork): MockupDocument {
  return {
    ...board({ width: 240, height: 130, wood: "Eastern white pine", thickness: 18, finish: clearCoat }),
    quantity: 6,
    layers: [
      layer({
        key: "B",
        name: "Lettering",
        stock: "Tide",
        thickness: 4.5,
        hold: bondToWood,
        pieces: reading("RACK 4", piecesOfColour({ ...artwork, at: { x: 20, y: 20 } }, "#28685C", "Letter")),
      }),
    ],
  };
}
