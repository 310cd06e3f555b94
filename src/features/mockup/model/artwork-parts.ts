import { deltaE00, labOf } from "#shared/colour/lab.ts";
import type { ColourMatch } from "#shared/colour/nearest-stock.ts";
import type { SuggestedLayer } from "./suggest-layers.ts";

/** What is to become of a part: a layer of its own, one with another part, pieces of a layer that is there, or nothing. */
export type Destination =
  | { readonly kind: "new" }
  | { readonly kind: "with"; readonly part: string }
  | { readonly kind: "layer"; readonly key: string }
  | { readonly kind: "out" };

/** Pieces of an artwork that go the same way: those of one colour, or some of them. */
export type ArtworkPart = {
  readonly id: string;
  readonly colour: string;
  readonly indices: readonly number[];
  readonly to: Destination;
  readonly sheet: number;
  readonly thickness: number;
  readonly deltaE: number;
  readonly match: ColourMatch;
  /** null until the hold was chosen by hand: it then follows what the layer will lie on. */
  readonly hold: number | null;
  readonly solid: boolean;
};

type Sized = { readonly index: number; readonly colour: string };

/** A part for each colour, in the order suggested, each a layer of its own. */
export function startParts(suggested: readonly SuggestedLayer[], pieces: readonly Sized[]): ArtworkPart[] {
  return suggested.map(({ colour, sheet, thickness, deltaE, match }) => ({
    id: colour,
    colour,
    indices: pieces.filter((piece) => piece.colour === colour).map(({ index }) => index),
    to: { kind: "new" },
    sheet,
    thickness,
    deltaE,
    match,
    hold: null,
    solid: false,
  }));
}

/** Changes fields of one part; the same parts when there is none of that id. */
export function changePart(
  parts: readonly ArtworkPart[],
  id: string,
  fields: Partial<Omit<ArtworkPart, "id" | "indices" | "to">>,
): readonly ArtworkPart[] {
  return parts.some((part) => part.id === id)
    ? parts.map((part) => (part.id === id ? { ...part, ...fields } : part))
    : parts;
}

/**
 * Sends a part elsewhere. A part can only go with one that makes a layer of its own; parts that went with this one stand alone
 * again when it no longer makes one. The same parts when the destination is impossible.
 */
export function sendPart(parts: readonly ArtworkPart[], id: string, to: Destination): readonly ArtworkPart[] {
  const part = parts.find((one) => one.id === id);
  if (!part) return parts;
  if (to.kind === "with") {
    const host = parts.find((one) => one.id === to.part);
    if (!host || host.id === id || host.to.kind !== "new") return parts;
  }
  return parts.map((one): ArtworkPart => {
    if (one.id === id) return { ...one, to };
    const followed = one.to.kind === "with" && one.to.part === id;
    return followed && to.kind !== "new" ? { ...one, to: { kind: "new" } } : one;
  });
}

/**
 * Takes some pieces of a part out as a part of their own, which goes its own way and keeps what was chosen. The same parts when
 * none or all of its pieces are named.
 */
export function splitPart(
  parts: readonly ArtworkPart[],
  id: string,
  indices: readonly number[],
): readonly ArtworkPart[] {
  const at = parts.findIndex((part) => part.id === id);
  const part = parts[at];
  if (!part) return parts;
  const chosen = new Set(indices);
  const taken = part.indices.filter((index) => chosen.has(index));
  if (taken.length === 0 || taken.length === part.indices.length) return parts;
  const rest = { ...part, indices: part.indices.filter((index) => !chosen.has(index)) };
  const own: ArtworkPart = { ...part, id: freeId(parts, part.colour), indices: taken, to: { kind: "new" } };
  return parts.toSpliced(at, 1, rest, own);
}

function freeId(parts: readonly ArtworkPart[], colour: string): string {
  const used = new Set(parts.map(({ id }) => id));
  for (let number = 2; ; number++) if (!used.has(`${colour} (${number})`)) return `${colour} (${number})`;
}

/** Colours up to this ΔE00 apart are taken for one that a file holds twice: "close", side by side. */
const alikeDeltaE = 2;

/**
 * Joins each part with a layer of its own to the first before it whose colour is another, but close. The same parts when no two
 * are: parts of one colour were split by hand.
 */
export function joinAlike(parts: readonly ArtworkPart[]): readonly ArtworkPart[] {
  let joined = parts;
  for (const part of parts) {
    if (part.to.kind !== "new") continue;
    const host = joined
      .slice(
        0,
        joined.findIndex(({ id }) => id === part.id),
      )
      .find(({ to, colour }) => to.kind === "new" && colour !== part.colour && isAlike(colour, part.colour));
    if (host) joined = sendPart(joined, part.id, { kind: "with", part: host.id });
  }
  return joined;
}

const isAlike = (a: string, b: string) => deltaE00(labOf(a), labOf(b)) <= alikeDeltaE;

/** Pieces by where they go: the layers that are to be made, in order, and what is added to layers that are there. */
export function destinationsOf(parts: readonly ArtworkPart[]): {
  readonly made: readonly { readonly part: ArtworkPart; readonly indices: readonly number[] }[];
  readonly added: readonly { readonly key: string; readonly indices: readonly number[] }[];
  readonly out: number;
} {
  const made = parts
    .filter(({ to }) => to.kind === "new")
    .map((part) => ({
      part,
      indices: [
        ...part.indices,
        ...parts.flatMap(({ to, indices }) => (to.kind === "with" && to.part === part.id ? indices : [])),
      ].sort((a, b) => a - b),
    }));
  const added = new Map<string, number[]>();
  for (const { to, indices } of parts)
    if (to.kind === "layer") added.set(to.key, [...(added.get(to.key) ?? []), ...indices]);
  const out = parts.reduce((sum, { to, indices }) => sum + (to.kind === "out" ? indices.length : 0), 0);
  return { made, added: [...added].map(([key, indices]) => ({ key, indices })), out };
}
