import { useMemo } from "react";
import { counted } from "@/lib/format.ts";
import { addCopies, idsOfCopy } from "../model/commands/add-copies.ts";
import { idsOfPaste, paste } from "../model/commands/paste.ts";
import { movableOf, shiftMotion } from "../model/commands/piece-motion.ts";
import { removePieces } from "../model/commands/pieces.ts";
import { copiedFromText, copyOf, piecesOfCopied } from "../model/copied.ts";
import { type chooseLayer, layerOfPiece, type Selection } from "../model/selection.ts";
import { keepCopied } from "./copy-shelf.ts";
import { useDesk } from "./desk-context.ts";
import { browserStorage } from "./kept-aids.ts";
import { newId } from "./new-id.ts";
import { useCopiedText } from "./use-copied-text.ts";

const tooMuch = "This would be more than a mockup takes.";

/** Copying, taking out, doubling and pasting what is chosen, here and in other jobs of the client. */
export function useCopying() {
  const { document, selection, site, client, copyPlace, edit, say } = useDesk();
  const text = useCopiedText(copyPlace);
  const read = useMemo(() => (text === null ? null : copiedFromText(text)), [text]);
  const { pieceIds } = selection;

  /** Whether it is kept. */
  function copy(): boolean {
    const copied = copyOf(document, pieceIds);
    if (copied === null) return false;
    const isKept = keepCopied(browserStorage(), copyPlace, copied);
    say(
      isKept
        ? `${counted(piecesOfCopied(copied), "piece")} copied, to be pasted in any job of ${client}.`
        : "This browser has no room to keep so much. Copy fewer pieces at once.",
    );
    return isKept;
  }

  function takeOut() {
    if (!copy()) return;
    edit({ label: "Take pieces out", change: (before) => removePieces(before, { pieceIds }) });
  }

  function double() {
    const movable = movableOf(document, pieceIds);
    if (movable.length === 0) return;
    const id = newId();
    const copies = { pieceIds: movable, motions: [shiftMotion(0, 0)], id, withHoles: true, site };
    if (addCopies(document, copies) === document) {
      say(tooMuch);
      return;
    }
    edit({
      label: `Double ${counted(movable.length, "piece")} in place`,
      change: (before) => addCopies(before, copies),
      choose: (after) => choosePieces(after, idsOfCopy(id, 0, movable.length)),
    });
  }

  /** Into a layer, or as layers of their own. */
  function pasteInto(into: string | null) {
    if (!read?.ok) {
      say(read?.why ?? `Nothing was copied yet in a job of ${client}.`);
      return;
    }
    const { copied } = read;
    const id = newId();
    const count = counted(piecesOfCopied(copied), "piece");
    if (paste(document, { copied, into, id, site }) === document) {
      say(tooMuch);
      return;
    }
    edit({
      label: into === null ? `Paste ${count}` : `Paste ${count} into ${into}`,
      change: (before) => paste(before, { copied, into, id, site }),
      choose: (after) => choosePieces(after, idsOfPaste({ copied, id })),
    });
  }

  /** The chosen layer takes single pieces; layers that were copied whole come as layers. */
  function pasteAsItCame() {
    const target = document.layers.find(({ key, locked }) => key === selection.layerKey && !locked);
    const areWhole = read?.ok && read.copied.document.layers.every(({ key }) => read.copied.wholeKeys.includes(key));
    pasteInto(areWhole || !target ? null : target.key);
  }

  return { read, copy, takeOut, double, pasteInto, pasteAsItCame };
}

function choosePieces(document: Parameters<typeof chooseLayer>[0], pieceIds: readonly string[]): Selection {
  const [first] = pieceIds;
  const layer = first === undefined ? undefined : layerOfPiece(document, first);
  return { layerKey: layer?.key ?? null, pieceIds, holeId: null };
}
