import createClipper from "clipper2-wasm";
import { clipperKernel } from "#shared/geometry/clipper-kernel.ts";
import { circlePath } from "#shared/geometry/shapes.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import { bringInArtwork } from "@/features/mockup/model/commands/bring-in-artwork.ts";
import { barrel, brass, cement, chalk, emptyMockup, midnight } from "./sample-mockup.ts";
import { inside } from "./sites.ts";

const artworkId = "0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11";

/**
 * A board of 600 × 400 with a disc of 275 mm on four standoffs in its middle (B, piece "disc"), a ring from 100 to 110 mm
 * bonded on the disc (C, piece "ring") and a sun of 40 mm bonded on the disc (D, piece "sun").
 */
export function signWithFigures() {
  const disc = addPlate(emptyMockup(), {
    shape: { kind: "circle", diameter: 275 },
    id: "disc",
    name: "Night disc",
    stock: midnight,
    thickness: 4.5,
    hold: { kind: "standoff", hardware: barrel(19) },
    site: inside,
  });
  const middle = { x: 110, y: 110 };
  const withRing = bringInArtwork(disc, {
    artwork: {
      artworkId,
      widthMm: 220,
      heightMm: 220,
      pieces: [
        {
          index: 0,
          colour: "#C8993A",
          path: [...circlePath(middle, 110), ...circlePath(middle, 100)],
          box: { x: 0, y: 0, width: 220, height: 220 },
          areaMm2: 6597,
        },
      ],
    },
    choices: [
      {
        colour: "#C8993A",
        name: "Ring",
        stock: brass,
        thickness: 3,
        hold: { kind: "bond", adhesive: cement },
        solid: false,
      },
    ],
    id: "ring",
    site: inside,
  });
  const sign = addPlate(withRing, {
    shape: { kind: "circle", diameter: 40 },
    id: "sun",
    name: "Sun",
    stock: chalk,
    thickness: 3,
    hold: { kind: "bond", adhesive: cement },
    site: inside,
  });
  // No job has this artwork, so that the sign can be saved in any: the ring becomes a plate with a short name.
  const document: MockupDocument = {
    ...sign,
    layers: sign.layers.map((layer) => ({
      ...layer,
      pieces: layer.pieces.map((piece) =>
        piece.id === "ring-1" ? { ...piece, id: "ring", source: { kind: "plate" as const } } : piece,
      ),
    })),
  };
  return {
    document,
    figuresOf: async (of: MockupDocument) => computeFigures(of, clipperKernel(await createClipper())),
  };
}
