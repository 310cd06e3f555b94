import { useState } from "react";
import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import { formatSize } from "#shared/units/format-length.ts";
import { Button } from "@/components/ui/button.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useSetArtworkWidth } from "../api/mutations.ts";
import { useDesk } from "../editor/desk-context.ts";
import { isWithinBounds } from "../model/length-bounds.ts";
import { drawnBox } from "../model/match-artworks.ts";

type ArtworkSizeProps = {
  readonly shop: string;
  readonly jobId: string;
  readonly artwork: { readonly id: string; readonly widthMm: number };
  readonly pieces: readonly ArtworkPiece[];
  readonly picked: ReadonlySet<number>;
};

const lengthBounds = { least: 0.1, most: 10_000 };

/** The true size by one length that somebody knows: of all that is drawn, or of the pieces that are picked. */
export function ArtworkSize({ shop, jobId, artwork, pieces, picked }: ArtworkSizeProps) {
  const { unit } = useDesk();
  const set = useSetArtworkWidth(shop, jobId, artwork.id);
  const [side, setSide] = useState<"width" | "height">("width");
  const [wanted, setWanted] = useState<number | null>(null);
  const whole = drawnBox(pieces);
  const known = drawnBox(pieces.filter(({ index }) => picked.has(index))) ?? whole;
  if (!whole || !known) return null;
  const factor = isWithinBounds(wanted, lengthBounds) && known[side] > 0 ? wanted / known[side] : null;
  const of = picked.size > 0 ? "of the picked" : "of all";
  return (
    <section aria-label="True size" className="space-y-2 border-t border-rule pt-3">
      <p className="text-sm font-semibold">True size: {formatSize(whole.width, whole.height, unit)}</p>
      <div className="grid grid-cols-2 gap-2">
        <Select
          label="Known length"
          value={side}
          onChange={(event) => setSide(event.target.value === "height" ? "height" : "width")}
        >
          <option value="width">width {of}</option>
          <option value="height">height {of}</option>
        </Select>
        <LengthField label="It is" unit={unit} value={wanted ?? known[side]} onChange={setWanted} />
      </div>
      {set.isError && <Notice tone="error">{messageOf(set.error)}</Notice>}
      <div className="flex flex-wrap items-center gap-3">
        <Button
          size="small"
          busy={set.isPending}
          disabled={factor === null || Math.abs(factor - 1) < 1e-6}
          onClick={() => {
            if (factor !== null) set.mutate(artwork.widthMm * factor, { onSuccess: () => setWanted(null) });
          }}
        >
          Set the true size
        </Button>
        {factor !== null && (
          <span className="text-sm text-graphite">
            All becomes {formatSize(whole.width * factor, whole.height * factor, unit)}.
          </span>
        )}
      </div>
    </section>
  );
}
