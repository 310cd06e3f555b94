import { useState } from "react";
import { faceOf, nameOfFace } from "#shared/lettering/faces.ts";
import type { Layer } from "#shared/mockup/document.ts";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import { useDesk } from "../editor/desk-context.ts";
import { letteringByHand } from "../model/lettering-by-hand.ts";
import { shortWords } from "../model/lettering-words.ts";
import { WordButton } from "./cell-controls.tsx";
import { SetAgainDialog } from "./set-again-dialog.tsx";

/** The lettering that a layer bears letters of, each to be set again. */
export function LetteringOfLayer({ layer }: { readonly layer: Layer }) {
  const ids = layer.pieces.flatMap(({ source }) => (source.kind === "lettering" ? [source.letteringId] : []));
  if (ids.length === 0) return null;
  return (
    <ul className="space-y-1 text-sm text-graphite" aria-label={`Lettering of ${layer.key}`}>
      {[...new Set(ids)].map((id) => (
        <LetteringLine key={id} letteringId={id} />
      ))}
    </ul>
  );
}

function LetteringLine({ letteringId }: { readonly letteringId: string }) {
  const { document, unit } = useDesk();
  const [open, setOpen] = useState(false);
  const byHand = letteringByHand(document, letteringId);
  if (!byHand) return null;
  const { lettering, lockedLayer } = byHand;
  const words = shortWords(lettering.words);
  const face = faceOf(lettering.face);
  return (
    <li className="flex flex-wrap items-baseline gap-x-3">
      <span>
        <span className="text-ink">“{words}”</span> set in {face ? nameOfFace(face) : "a face no longer shipped"},
        capitals {formatLengthWithUnit(lettering.capHeight, unit)} high
      </span>
      <WordButton
        aria-label={`Set “${words}” again`}
        aria-disabled={lockedLayer !== null}
        onClick={() => lockedLayer === null && setOpen(true)}
      >
        set again
      </WordButton>
      {lockedLayer !== null && <span>{lockedLayer} is locked; unlock it to set the words again.</span>}
      <SetAgainDialog byHand={byHand} open={open} onOpenChange={setOpen} />
    </li>
  );
}
