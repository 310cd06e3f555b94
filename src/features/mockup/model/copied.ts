import { z } from "zod";
import type { Layer, MockupDocument } from "#shared/mockup/document.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";
import { withoutUnusedLettering } from "#shared/mockup/without-unused-lettering.ts";
import { holesWithin } from "./commands/piece-motion.ts";
import { withFixed } from "./commands/pieces.ts";

/** Of how what was copied is kept; a document inside has a version of its own. */
const copiedVersion = 1;

/** What was copied at a desk: a document of nothing but the copied pieces in their layers, so that an older one is read as documents are. */
export type Copied = {
  readonly document: MockupDocument;
  /** Keys of the layers that were copied whole. */
  readonly wholeKeys: readonly string[];
};

const keptSchema = z.strictObject({
  version: z.literal(copiedVersion),
  wholeKeys: z.array(z.string()).max(60),
  document: z.unknown(),
});

/** The chosen pieces to be kept until they are pasted, with the holes in them; null when there are none. */
export function copyOf(document: MockupDocument, pieceIds: readonly string[]): Copied | null {
  const chosen = new Set(pieceIds);
  const wholeKeys: string[] = [];
  const layers = document.layers.flatMap((layer): Layer[] => {
    const pieces = layer.pieces.filter(({ id }) => chosen.has(id));
    if (pieces.length === 0) return [];
    if (pieces.length === layer.pieces.length) wholeKeys.push(layer.key);
    const within = holesWithin(layer, chosen);
    const hold =
      layer.hold.kind === "standoff"
        ? { ...layer.hold, holes: withFixed(layer.hold.holes.filter((hole) => within.has(hole.id))) }
        : layer.hold;
    return [{ ...layer, pieces, hold, hidden: false, locked: false }];
  });
  if (layers.length === 0) return null;
  const presentation = { ...document.presentation, photo: null };
  return { wholeKeys, document: withoutUnusedLettering({ ...document, presentation, layers }) };
}

export const piecesOfCopied = ({ document }: Copied): number =>
  document.layers.reduce((sum, { pieces }) => sum + pieces.length, 0);

export function copiedToText(copied: Copied): string {
  return JSON.stringify({ version: copiedVersion, ...copied });
}

export type ReadCopied = { readonly ok: true; readonly copied: Copied } | { readonly ok: false; readonly why: string };

/** What was copied, out of a text that anything could have been written to; refused in words when it is not that. */
export function copiedFromText(text: string): ReadCopied {
  const kept = keptSchema.safeParse(parsed(text));
  if (!kept.success) return { ok: false, why: "What was copied can’t be read. Copy it again." };
  const read = readDocument(kept.data.document);
  if (!read.ok) return { ok: false, why: `What was copied can’t be taken: ${read.reason}` };
  if (read.document.layers.every(({ pieces }) => pieces.length === 0))
    return { ok: false, why: "Nothing was copied. Copy it again." };
  return { ok: true, copied: { wholeKeys: kept.data.wholeKeys, document: read.document } };
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
