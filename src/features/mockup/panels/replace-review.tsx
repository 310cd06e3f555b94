import { useMemo, useState } from "react";
import type { Artwork } from "#shared/contracts/artworks.ts";
import type { Piece } from "#shared/mockup/document.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import type { ArtworkToBringIn } from "../model/commands/bring-in-artwork.ts";
import { replaceArtwork } from "../model/commands/replace-artwork.ts";
import { matchArtworks } from "../model/match-artworks.ts";
import { nameOfPiece } from "../model/piece-name.ts";
import { layersForCome, reportReplacement } from "../model/replacement-report.ts";
import { ArtworkPicture } from "./artwork-picture.tsx";
import { Swatch } from "./cell-controls.tsx";

type ReplaceReviewProps = {
  readonly artwork: Artwork;
  readonly before: ArtworkToBringIn & { readonly name: string };
  readonly after: ArtworkToBringIn;
  readonly onDone: () => void;
};

/** What changes when a new artwork takes the place of another, layer by layer, before it happens. */
export function ReplaceReview({ artwork, before, after, onDone }: ReplaceReviewProps) {
  const { document, edit } = useDesk();
  const [size, setSize] = useState<"as before" | "its own">("as before");
  const [sent, setSent] = useState<ReadonlyMap<string, string>>(new Map());
  const match = useMemo(() => matchArtworks(before, after, size), [before, after, size]);
  const proposed = useMemo(() => layersForCome(document, { before, after, match }), [document, before, after, match]);
  const colourOf = (index: number) => after.pieces.find((piece) => piece.index === index)?.colour ?? "";
  const come = new Map(
    match.come.flatMap((index): [number, string][] => {
      const key = sent.get(colourOf(index)) ?? proposed.get(index) ?? "";
      return key === "" ? [] : [[index, key]];
    }),
  );
  const replacement = { before, after, match, come };
  const report = reportReplacement(document, replacement);
  const comeColours = [...new Set(match.come.map(colourOf))];
  const fresh = new Set(match.come);
  const layers = document.layers.filter(({ locked }) => !locked);
  const names = new Map(
    document.layers.flatMap(({ pieces }) => pieces.map((one, at) => [one.id, nameOfPiece(one, at)])),
  );
  const nameOf = ({ id }: Piece) => names.get(id) ?? "";

  function replace() {
    const id = newId();
    edit({
      label: `Put ${artwork.name} in place of ${before.name}`,
      change: (current) => replaceArtwork(current, { ...replacement, id }),
    });
    onDone();
  }

  return (
    <div className="grid gap-6 lg:grid-cols-[minmax(16rem,26rem)_minmax(0,1fr)]">
      <div className="space-y-3">
        <ArtworkPicture
          label={`${artwork.name}; what is new in it is outlined`}
          {...after}
          colourOf={colourOf}
          picked={fresh}
        />
        <Select
          label="Its size"
          value={size}
          onChange={(event) => setSize(event.target.value === "its own" ? "its own" : "as before")}
        >
          <option value="as before">as wide as {before.name}</option>
          <option value="its own">its own true size</option>
        </Select>
      </div>
      <div className="min-w-0 space-y-4">
        <ul className="divide-y divide-rule border-y border-rule">
          {report.layers.map(({ key, name, same, changed, gone, come: arrived, isLocked }) => (
            <li key={key} className="space-y-1 py-2">
              <h3 className="text-base font-semibold">
                {key}, {name}
              </h3>
              {isLocked ? (
                <p className="text-sm">Locked: its pieces stay as they are.</p>
              ) : (
                <dl className="text-sm">
                  <Line title="As it was" text={same > 0 ? counted(same, "piece") : ""} />
                  <Line
                    title="Changed"
                    text={changed.map(({ piece, how }) => `${nameOf(piece)} ${how.join(", ")}`).join("; ")}
                  />
                  <Line title="Gone" text={gone.map(nameOf).join(", ")} isGrave />
                  <Line title="Come" text={arrived.length > 0 ? counted(arrived.length, "piece") : ""} />
                </dl>
              )}
            </li>
          ))}
        </ul>
        {comeColours.length > 0 && (
          <fieldset className="space-y-2">
            <legend className="text-sm font-semibold">Pieces that have no counterpart in {before.name}</legend>
            {comeColours.map((colour) => {
              const indices = match.come.filter((index) => colourOf(index) === colour);
              const [first = -1] = indices;
              return (
                <Select
                  key={colour}
                  label={
                    <span className="inline-flex items-center gap-2">
                      <Swatch colour={colour} /> {colour}, {counted(indices.length, "piece")}
                    </span>
                  }
                  value={sent.get(colour) ?? proposed.get(first) ?? ""}
                  onChange={(event) => setSent(new Map(sent).set(colour, event.target.value))}
                >
                  <option value="">left out; bring them in as layers afterwards</option>
                  {layers.map(({ key, name }) => (
                    <option key={key} value={key}>
                      into {key}, {name}
                    </option>
                  ))}
                </Select>
              );
            })}
          </fieldset>
        )}
        {report.madeFrom > 0 && (
          <Notice tone="caution">
            {counted(report.madeFrom, "plate or piece was", "plates or pieces were")} made from {before.name} and keep
            that outline: make them anew where it matters.
          </Notice>
        )}
        <p className="text-sm text-graphite">
          Layers keep their stock, hold, hardware, offset and holes. The dry fit tells which holes no longer lie in a
          piece. Undo brings everything back.
        </p>
        <div className="flex flex-wrap justify-end gap-3">
          <Button onClick={onDone}>Cancel</Button>
          <Button onClick={replace} disabled={match.pairs.length === 0}>
            Put it in place
          </Button>
        </div>
        {match.pairs.length === 0 && (
          <p className="text-right text-sm text-oxblood">
            Nothing in it resembles {before.name}. Bring it in as layers instead.
          </p>
        )}
      </div>
    </div>
  );
}

function Line({
  title,
  text,
  isGrave = false,
}: {
  readonly title: string;
  readonly text: string;
  readonly isGrave?: boolean;
}) {
  if (text === "") return null;
  return (
    <div className="flex gap-2">
      <dt className="w-20 shrink-0 text-graphite">{title}</dt>
      <dd className={isGrave ? "text-oxblood" : ""}>{text}</dd>
    </div>
  );
}
