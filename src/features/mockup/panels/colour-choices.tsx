import { useQueryClient } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import type { ColourMatch } from "#shared/colour/nearest-stock.ts";
import type { Artwork } from "#shared/contracts/artworks.ts";
import { Button } from "@/components/ui/button.tsx";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { counted } from "@/lib/format.ts";
import { mockupQueries } from "../api/queries.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { bringInArtwork, type ColourChoice } from "../model/commands/bring-in-artwork.ts";
import { chooseLayer } from "../model/selection.ts";
import { optionsOfHold, type StockChoices } from "../model/stock-choices.ts";
import { type SuggestedLayer, suggestHold, suggestLayers } from "../model/suggest-layers.ts";
import { Swatch } from "./cell-controls.tsx";
import { type LayerChoice, LayerFields } from "./layer-fields.tsx";

type Row = Omit<SuggestedLayer & LayerChoice, "hold"> & {
  /** null until the hold was chosen by hand: it then follows what the layer will lie on. */
  readonly hold: number | null;
  readonly wanted: boolean;
  readonly solid: boolean;
};

const matchWords: Record<ColourMatch, string> = {
  same: "the colour of the artwork",
  close: "close to the artwork",
  visible: "off the artwork, it shows side by side",
  "another colour": "another colour than the artwork",
};

type ColourChoicesProps = { readonly shop: string; readonly artwork: Artwork; readonly onDone: () => void };

/** The colours of one artwork with what is proposed for each. */
export function ColourChoices({ shop, artwork, onDone }: ColourChoicesProps) {
  const { stock, site, edit } = useDesk();
  const client = useQueryClient();
  const proposed = useMemo(
    () =>
      suggestLayers(artwork.colours, stock.acrylics).map(
        (layer): Row => ({ ...layer, hold: null, wanted: true, solid: false }),
      ),
    [artwork.colours, stock.acrylics],
  );
  const [rows, setRows] = useState(proposed);
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const wanted = rows.filter((row) => row.wanted);
  const hasPlate = wanted.some((row) => row.solid);
  const holdOf = (row: Row) => row.hold ?? suggestHold(stock, hasPlate && !row.solid ? "acrylic" : "wood");

  function change(colour: string, fields: Partial<Row>) {
    setRows((before) => before.map((row) => (row.colour === colour ? { ...row, ...fields } : row)));
  }

  async function bringIn() {
    setBusy(true);
    setProblem(null);
    try {
      const { widthMm, heightMm, pieces } = await client.fetchQuery(mockupQueries.pieces(shop, artwork.id));
      // Solid plates lie under what is bonded on them.
      const choices = wanted
        .toSorted((a, b) => Number(b.solid) - Number(a.solid))
        .flatMap((row) => choiceOf(row, holdOf(row), stock));
      const id = newId();
      edit({
        label: `Bring in ${artwork.name}`,
        change: (before) =>
          bringInArtwork(before, { artwork: { artworkId: artwork.id, widthMm, heightMm, pieces }, choices, id, site }),
        choose: (after) => chooseLayer(after, after.layers.at(-1)?.key ?? ""),
      });
      onDone();
    } catch (error) {
      setProblem(messageOf(error));
    } finally {
      setBusy(false);
    }
  }

  return (
    <form
      className="space-y-4"
      onSubmit={(event) => {
        event.preventDefault();
        void bringIn();
      }}
    >
      <ul className="divide-y divide-rule border-y border-rule">
        {rows.map((row) => (
          <li key={row.colour} className="space-y-2 py-3">
            <Checkbox
              label={
                <span className="inline-flex items-center gap-2">
                  <Swatch colour={row.colour} /> {row.colour}, {counted(row.pieces, "piece")}
                </span>
              }
              checked={row.wanted}
              onChange={(event) => change(row.colour, { wanted: event.target.checked })}
            />
            {row.wanted && (
              <>
                <LayerFields
                  of={`of ${row.colour}`}
                  choice={{ ...row, hold: holdOf(row) }}
                  onChange={({ sheet, thickness, hold }) =>
                    change(row.colour, { sheet, thickness, ...(hold === holdOf(row) ? {} : { hold }) })
                  }
                  {...(row.sheet === sheetOf(proposed, row.colour) ? { hint: matchWords[row.match] } : {})}
                />
                <Checkbox
                  label="Close its openings"
                  hint="One plate to bond the other colours on, instead of pieces that lie between them."
                  checked={row.solid}
                  onChange={(event) => change(row.colour, { solid: event.target.checked })}
                />
              </>
            )}
          </li>
        ))}
      </ul>
      {problem && (
        <Notice tone="error" title="Nothing was brought in.">
          {problem}
        </Notice>
      )}
      <div className="flex flex-wrap justify-end gap-3">
        <Button onClick={onDone}>Cancel</Button>
        <Button type="submit" busy={busy} disabled={wanted.length === 0}>
          Bring in {counted(wanted.length, "layer")}
        </Button>
      </div>
    </form>
  );
}

function sheetOf(rows: readonly Row[], colour: string): number | undefined {
  return rows.find((row) => row.colour === colour)?.sheet;
}

function choiceOf(row: Row, holdIndex: number, stock: StockChoices): ColourChoice[] {
  const sheet = stock.acrylics[row.sheet];
  const hold = optionsOfHold(stock)[holdIndex];
  if (!sheet || !hold) return [];
  const { colour, thickness, solid } = row;
  return [{ colour, thickness, solid, hold, stock: sheet.acrylic, name: sheet.acrylic.name }];
}
