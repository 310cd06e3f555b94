import { useMemo, useState } from "react";
import type { Artwork } from "#shared/contracts/artworks.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { cx } from "@/lib/cx.ts";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import {
  type ArtworkPart,
  changePart,
  destinationsOf,
  joinAlike,
  sendPart,
  splitPart,
  startParts,
} from "../model/artwork-parts.ts";
import { type ArtworkToBringIn, bringInArtwork, type ColourChoice } from "../model/commands/bring-in-artwork.ts";
import { mostLayers, mostPieces } from "../model/limits.ts";
import { chooseLayer } from "../model/selection.ts";
import { sheetOfPart } from "../model/sheet-of-part.ts";
import { optionsOfHold } from "../model/stock-choices.ts";
import { suggestHold, suggestLayers } from "../model/suggest-layers.ts";
import { ArtworkPicture } from "./artwork-picture.tsx";
import { ArtworkSize } from "./artwork-size.tsx";
import { WordButton } from "./cell-controls.tsx";
import { PartRow } from "./part-row.tsx";
import { PickedPieces } from "./picked-pieces.tsx";

type ColourChoicesProps = {
  readonly shop: string;
  readonly jobId: string;
  readonly artwork: Artwork;
  readonly drawing: ArtworkToBringIn;
  readonly onDone: () => void;
};

const columns = [
  { title: "Goes to", width: "w-[20%]" },
  { title: "Stock", width: "w-[16%]" },
  { title: "Difference", width: "" },
  { title: "Thickness", width: "w-[7%]" },
  { title: "Held by", width: "w-[20%]" },
] as const;

/** The colours of one artwork: what each is cut from, which go together, elsewhere or nowhere, and the picture that makes. */
export function ColourChoices({ shop, jobId, artwork, drawing, onDone }: ColourChoicesProps) {
  const { document, stock, site, edit } = useDesk();
  const [parts, setParts] = useState<readonly ArtworkPart[]>(() =>
    startParts(suggestLayers(artwork.colours, stock.acrylics), drawing.pieces),
  );
  const [picked, setPicked] = useState<ReadonlySet<number>>(new Set());
  const { made, added, out } = destinationsOf(parts);
  const hasPlate = made.some(({ part }) => part.solid);
  const holdOf = (part: ArtworkPart) => part.hold ?? suggestHold(stock, hasPlate && !part.solid ? "acrylic" : "wood");
  const sheets = useMemo(() => {
    const byIndex = new Map<number, string | null>();
    for (const part of parts) {
      const colour = sheetOfPart(part, { parts, document, stock })?.colour ?? null;
      for (const index of part.indices) byIndex.set(index, colour);
    }
    return byIndex;
  }, [parts, document, stock]);
  const joined = joinAlike(parts);
  const alike = joined.filter((part, at) => part !== parts[at]).length;

  const problem = roomProblem(document, { made, added });

  function pick(index: number) {
    setPicked((before) => {
      const next = new Set(before);
      if (!next.delete(index)) next.add(index);
      return next;
    });
  }

  function split() {
    setParts((before) => before.reduce((next, { id }) => splitPart(next, id, [...picked]), before));
    setPicked(new Set());
  }

  function bringIn() {
    // Solid plates lie under what is bonded on them.
    const choices = made
      .toSorted((a, b) => Number(b.part.solid) - Number(a.part.solid))
      .flatMap(({ part, indices }): ColourChoice[] => {
        const sheet = stock.acrylics[part.sheet]?.acrylic;
        const hold = optionsOfHold(stock)[holdOf(part)];
        if (!sheet || !hold) return [];
        const { colour, thickness, solid } = part;
        return [{ colour, indices, thickness, solid, hold, stock: sheet, name: sheet.name }];
      });
    const id = newId();
    edit({
      label: `Bring in ${artwork.name}`,
      change: (before) => bringInArtwork(before, { artwork: drawing, choices, added, id, site }),
      choose: (after) =>
        chooseLayer(after, choices.length > 0 ? (after.layers.at(-1)?.key ?? "") : (added[0]?.key ?? "")),
    });
    onDone();
  }

  return (
    <div className="grid gap-6 lg:grid-cols-[minmax(16rem,26rem)_minmax(0,1fr)]">
      <div className="space-y-3">
        <ArtworkPicture
          label={`${artwork.name} as it will be cut`}
          {...drawing}
          colourOf={(index) => sheets.get(index) ?? null}
          picked={picked}
          onPick={pick}
        />
        <PickedPieces
          parts={parts}
          pieces={drawing.pieces}
          picked={picked}
          onPick={pick}
          onClear={() => setPicked(new Set())}
          onSplit={split}
        />
        {artwork.can.change && (
          <ArtworkSize
            shop={shop}
            jobId={jobId}
            artwork={{ id: artwork.id, widthMm: drawing.widthMm }}
            pieces={drawing.pieces}
            picked={picked}
          />
        )}
      </div>
      <div className="min-w-0 space-y-3">
        {alike > 0 && (
          <p className="text-sm">
            {counted(alike, "colour looks", "colours look")} like another one.{" "}
            <WordButton inText onClick={() => setParts(joined)}>
              Join what looks the same
            </WordButton>
          </p>
        )}
        <div className="overflow-x-auto lg:max-h-[58dvh] lg:overflow-y-auto">
          <table className="w-full min-w-3xl border-collapse">
            <thead className="sticky top-0 z-10 bg-sheet text-left text-fine text-graphite">
              <tr className="border-b border-ink">
                <th scope="col" className="py-1 pr-3 font-semibold">
                  Artwork, sheet
                </th>
                {columns.map(({ title, width }) => (
                  <th key={title} scope="col" className={cx("px-1 font-semibold", width)}>
                    {title}
                  </th>
                ))}
                <th scope="col" className="text-center font-semibold" title="One plate to bond the other colours on">
                  Openings closed
                </th>
              </tr>
            </thead>
            <tbody>
              {parts.map((part) => (
                <PartRow
                  key={part.id}
                  part={part}
                  parts={parts}
                  hold={holdOf(part)}
                  onSend={(to) => setParts((before) => sendPart(before, part.id, to))}
                  onChange={(fields) => setParts((before) => changePart(before, part.id, fields))}
                />
              ))}
            </tbody>
          </table>
        </div>
        {problem && <Notice tone="caution">{problem}</Notice>}
        <div className="flex flex-wrap items-center justify-end gap-3">
          <p className="mr-auto text-sm text-graphite">{wordsOf(made.length, added.length, out)}</p>
          <Button onClick={onDone}>Cancel</Button>
          <Button onClick={bringIn} disabled={made.length + added.length === 0 || problem !== null}>
            {made.length === 0 && added.length > 0 ? "Add to the layers" : `Bring in ${counted(made.length, "layer")}`}
          </Button>
        </div>
      </div>
    </div>
  );
}

/** Why a document can't take all that is to be brought in; null when it can. */
function roomProblem(
  { layers }: MockupDocument,
  { made, added }: Pick<ReturnType<typeof destinationsOf>, "made" | "added">,
): string | null {
  const over = layers.length + made.length - mostLayers;
  if (over > 0)
    return `A mockup takes ${mostLayers} layers: join or leave out ${counted(over, "colour")} more, or send them to a layer that is there.`;
  const crowded = [
    ...made.map(({ indices }) => indices.length),
    ...added.map(
      ({ key, indices }) => indices.length + (layers.find((layer) => layer.key === key)?.pieces.length ?? 0),
    ),
  ].some((count) => count > mostPieces);
  return crowded ? `A layer takes ${mostPieces} pieces: split the colour that has more.` : null;
}

function wordsOf(made: number, added: number, out: number): string {
  return [
    counted(made, "new layer"),
    ...(added > 0 ? [`pieces added to ${counted(added, "layer")}`] : []),
    ...(out > 0 ? [`${counted(out, "piece")} left out`] : []),
  ].join(", ");
}
