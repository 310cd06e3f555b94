import { type ReactNode, useMemo, useState } from "react";
import { useDesk } from "../editor/desk-context.ts";
import type { Said } from "../editor/use-voice.ts";
import { anchorPoint, anchors, middleAnchor } from "../model/anchors.ts";
import { findHole } from "../model/chosen-box.ts";
import { chosenWords, whyHoleStays, whyIdle } from "../model/chosen-words.ts";
import { setHole } from "../model/commands/holes.ts";
import { boxOfPieces, mirrorPieces, placePiece, turnPieces } from "../model/commands/pieces.ts";
import { type PlaceOfChosen, placeChosen } from "../model/commands/place-chosen.ts";
import { coordinateBounds, sizeBounds } from "../model/limits.ts";
import { readDegrees } from "../model/read-number.ts";
import { CellLength, CellSelect, CellText } from "./cell-controls.tsx";
import { ToolWord } from "./tool-word.tsx";

/** Place, size and turn of what is chosen as a whole, in figures, and what was done last. */
export function PlaceStrip({ said }: { readonly said: Said }) {
  const { document, selection } = useDesk();
  const words = chosenWords(document, selection);
  const isHole = selection.holeId !== null;
  return (
    <section
      aria-label="Place of what is chosen"
      data-desk-part
      className="flex min-h-10 flex-wrap items-center gap-x-3 border-b border-rule px-4 py-1 sm:px-6"
    >
      <p className="max-w-64 min-w-0 truncate text-sm font-semibold text-ink" title={words ?? undefined}>
        {words ?? "Nothing is chosen"}
      </p>
      {words === null && (
        <p className="text-fine text-graphite">
          Choose a layer by its key in the schedule, or press a piece, to set its place in figures.
        </p>
      )}
      {words !== null && (isHole ? <HoleFigures /> : <PieceFigures />)}
      <p role="status" className="ml-auto max-w-96 min-w-0 truncate text-fine text-graphite" title={said.words}>
        <span key={said.turn}>{said.words}</span>
      </p>
    </section>
  );
}

function PieceFigures() {
  const { document, selection, unit, edit } = useDesk();
  const [at, setAt] = useState(0);
  const { pieceIds } = selection;
  const anchor = anchors[at] ?? middleAnchor;
  const box = useMemo(() => boxOfPieces(document, pieceIds), [document, pieceIds]);
  const only = useMemo(() => findOnly(document, pieceIds), [document, pieceIds]);
  const why = whyIdle(document, selection);
  if (!box) return <p className="text-fine text-graphite">There are no pieces in it.</p>;
  const point = anchorPoint(box, anchor);
  const place = (to: PlaceOfChosen) =>
    edit({ label: "Place in figures", change: (before) => placeChosen(before, { pieceIds, anchor, ...to }) });
  const mirror = (way: "across" | "down") =>
    edit({ label: `Mirror ${way}`, change: (before) => mirrorPieces(before, { pieceIds, way }) });
  const length = { unit, exact: true, disabled: why !== null, title: why ?? undefined };

  function turn(text: string): string | null {
    const degrees = readDegrees(text);
    if (degrees === null) return "Write degrees, like 15 or −7.5.";
    edit({
      label: only ? `Turn to ${degrees}°` : `Turn by ${degrees}°`,
      change: (before) =>
        only ? placePiece(before, { pieceId: only.id, turn: degrees }) : turnPieces(before, { pieceIds, by: degrees }),
    });
    return null;
  }

  return (
    <>
      <Labelled words="at its" width="w-36">
        <CellSelect aria-label="Measured at" value={at} onChange={(event) => setAt(Number(event.target.value))}>
          {anchors.map(({ words }, index) => (
            <option key={words} value={index}>
              {words}
            </option>
          ))}
        </CellSelect>
      </Labelled>
      <Labelled words={`x, ${unit}`}>
        <CellLength
          {...length}
          aria-label="x of what is chosen"
          mm={point.x}
          bounds={coordinateBounds}
          onCommit={(x) => place({ x })}
        />
      </Labelled>
      <Labelled words="y">
        <CellLength
          {...length}
          aria-label="y of what is chosen"
          mm={point.y}
          bounds={coordinateBounds}
          onCommit={(y) => place({ y })}
        />
      </Labelled>
      <Labelled words="wide">
        <CellLength
          {...length}
          aria-label="Width of what is chosen"
          mm={box.width}
          bounds={sizeBounds}
          onCommit={(width) => place({ width })}
        />
      </Labelled>
      <Labelled words="high">
        <CellLength
          {...length}
          aria-label="Height of what is chosen"
          mm={box.height}
          bounds={sizeBounds}
          onCommit={(height) => place({ height })}
        />
      </Labelled>
      <Labelled words={only ? "turned" : "turn by"} width="w-14">
        <CellText
          aria-label={only ? "Turn of what is chosen, degrees" : "Turn what is chosen by, degrees"}
          inputMode="decimal"
          disabled={why !== null}
          value={only ? `${plainDegrees(only.placement.turn)}°` : "0°"}
          onCommit={turn}
        />
      </Labelled>
      <span className="flex gap-x-1">
        <ToolWord why={why} onClick={() => mirror("across")}>
          mirror across
        </ToolWord>
        <ToolWord why={why} onClick={() => mirror("down")}>
          mirror down
        </ToolWord>
      </span>
      {why !== null && <span className="text-fine text-graphite">{why}</span>}
    </>
  );
}

function HoleFigures() {
  const { document, selection, unit, edit } = useDesk();
  const hole = selection.holeId === null ? null : findHole(document, selection.holeId);
  if (!hole) return null;
  const place = (to: { x?: number; y?: number }) =>
    edit({ label: "Place a hole", change: (before) => setHole(before, { holeId: hole.id, ...to }) });
  const why = whyHoleStays(document, hole.id);
  const length = { unit, exact: true, bounds: coordinateBounds, disabled: why !== null };
  return (
    <>
      <Labelled words={`x, ${unit}`}>
        <CellLength {...length} aria-label="x of the chosen hole" mm={hole.x} onCommit={(x) => place({ x })} />
      </Labelled>
      <Labelled words="y">
        <CellLength {...length} aria-label="y of the chosen hole" mm={hole.y} onCommit={(y) => place({ y })} />
      </Labelled>
      {why !== null && <span className="text-fine text-graphite">{why}</span>}
    </>
  );
}

type LabelledProps = { readonly words: string; readonly width?: string; readonly children: ReactNode };

function Labelled({ words, width = "w-20", children }: LabelledProps) {
  return (
    <span className="flex items-baseline gap-x-1.5">
      <span aria-hidden="true" className="text-fine whitespace-nowrap text-graphite">
        {words}
      </span>
      <span className={width}>{children}</span>
    </span>
  );
}

function findOnly(document: Parameters<typeof boxOfPieces>[0], pieceIds: readonly string[]) {
  const [id, ...others] = pieceIds;
  if (id === undefined || others.length > 0) return null;
  return document.layers.flatMap(({ pieces }) => pieces).find((piece) => piece.id === id) ?? null;
}

/** Degrees with four decimals at most. */
const plainDegrees = (degrees: number): number => Math.round(degrees * 10_000) / 10_000;
