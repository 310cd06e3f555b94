import type { z } from "zod";
import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import type { artworkPieces, artworkSchema } from "#shared/contracts/artworks.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { placePath } from "#shared/geometry/placement.ts";
import { type Artwork, isPicture } from "../models/artwork.ts";
import type { Actor } from "../policies/actor.ts";
import { artworkPolicy } from "../policies/artwork.ts";
import type { JobFacts } from "../policies/job.ts";

/** An artwork with lengths at its true size. */
export function presentArtwork(actor: Actor, facts: JobFacts, artwork: Artwork): z.input<typeof artworkSchema> {
  const { summary, scale, file, adder } = artwork;
  if (!file) throw new Error("An artwork is presented with its file.");
  const may = artworkPolicy.change(actor, facts);
  return {
    id: artwork.id,
    name: artwork.name,
    state: artwork.state,
    sha256: file.sha256,
    byteSize: file.byteSize,
    addedAt: artwork.addedAt.toISOString(),
    addedBy: adder?.name ?? "",
    widthMm: summary ? summary.widthMm * scale : null,
    heightMm: summary ? summary.heightMm * scale : null,
    colours: summary ? summary.colours.map((group) => ({ ...group, areaMm2: group.areaMm2 * scale * scale })) : [],
    warnings: summary ? [...summary.warnings] : [],
    refusal: artwork.refusal,
    trace: isPicture(artwork) ? presentTrace(artwork) : null,
    can: {
      change: may && artwork.state === "ready",
      remove: may,
      trace: may && isPicture(artwork) && artwork.state !== "importing",
    },
  };
}

function presentTrace({ trace, traceAsked, traceFailure, scale }: Artwork): z.input<typeof artworkSchema>["trace"] {
  return {
    record: trace && {
      ...trace,
      found: trace.found.map((colour) => ({ ...colour })),
      smallestMm2: trace.smallestMm2 * scale * scale,
    },
    asked: traceAsked,
    failure: traceFailure,
  };
}

/** The pieces at the artwork's true size. */
export function presentPieces(artwork: Artwork): z.input<typeof artworkPieces> {
  const { summary, scale, pieces } = artwork;
  if (!summary || pieces === null) throw new Error("Pieces are presented once they are there.");
  const stored = JSON.parse(pieces) as readonly ArtworkPiece[];
  return {
    id: artwork.id,
    widthMm: summary.widthMm * scale,
    heightMm: summary.heightMm * scale,
    pieces: stored.map(({ index, colour, path, areaMm2 }) => {
      const placed = placePath(path, { x: 0, y: 0, turn: 0, scale, mirrored: false });
      return {
        index,
        colour,
        path: placed.map(({ start, segments }) => ({ start, segments: [...segments] })),
        box: boxOfPath(placed) ?? { x: 0, y: 0, width: 0, height: 0 },
        areaMm2: areaMm2 * scale * scale,
      };
    }),
  };
}
