import type { z } from "zod";
import type { portfolioPieceSchema } from "#shared/contracts/portfolio.ts";
import { formatSize } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { paths } from "@/app/paths.ts";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { cx } from "@/lib/cx.ts";
import { DrawingSvg } from "@/lib/drawing-svg.tsx";

type Piece = z.infer<typeof portfolioPieceSchema>;

/** One approved piece with whether its client agreed. */
export function PieceCard({
  shop,
  unit,
  piece,
  chosen,
  onChoose,
}: {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly piece: Piece;
  readonly chosen: boolean | null;
  readonly onChoose: (wanted: boolean) => void;
}) {
  return (
    <li className={cx("flex flex-col border bg-sheet", chosen ? "border-indigo" : "border-rule")}>
      <div className="flex h-52 items-center justify-center border-b border-rule p-4">
        <DrawingSvg
          list={piece.elevation}
          title={`Front of ${piece.title} for ${piece.client}`}
          className="max-h-full max-w-full"
        />
      </div>
      <div className="flex-1 px-4 py-3">
        <TextLink to={paths.job(shop, piece.jobId)} className="font-semibold">
          {piece.title}
        </TextLink>
        <p className="text-sm text-graphite">
          {piece.client}, revision {piece.letter}, {formatSize(piece.widthMm, piece.heightMm, unit)}
        </p>
        <p className={cx("mt-1 text-sm font-semibold", piece.consent ? "text-verdigris" : "text-ochre")}>
          {piece.consent ? "The client agreed to its being shown" : "Not to be shown: the client has not agreed"}
        </p>
        {chosen !== null && (
          <Checkbox
            label={`Show ${piece.title}`}
            disabled={!piece.consent}
            checked={chosen}
            onChange={(event) => onChoose(event.target.checked)}
          />
        )}
      </div>
    </li>
  );
}
