import type { z } from "zod";
import type { openShareLink } from "#shared/contracts/portfolio.ts";
import { formatLengthWithUnit, formatSize } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { DrawingSvg } from "@/lib/drawing-svg.tsx";
import { romanNumber } from "../model/roman.ts";

export type PlatePiece = z.infer<(typeof openShareLink)["result"]>["pieces"][number];

type PlateProps = { readonly piece: PlatePiece; readonly number: number; readonly unit: LengthUnit };

export const plateId = (number: number): string => `plate-${number}`;

/** One sign as a plate of a book: the picture large, the section beside it at its scale, the facts below in small type. */
export function Plate({ piece, number, unit }: PlateProps) {
  const { title, client, widthMm, heightMm, offWallMm, materials, elevation, section } = piece;
  return (
    <article id={plateId(number)} aria-labelledby={`${plateId(number)}-title`} className="break-inside-avoid">
      <figure>
        <div className="border border-ink bg-sheet p-2 sm:p-3">
          <div className="items-center gap-6 border border-rule p-2 sm:flex sm:p-6">
            <div className="min-w-0" style={{ flex: `${elevation.widthMm} 1 0` }}>
              <DrawingSvg list={elevation} title={`${title}, from the front`} className="block h-auto w-full" />
            </div>
            {/* Widths shared out by mm give both views one scale. */}
            <div className="mx-auto mt-4 w-44 min-w-0 sm:m-0 sm:w-auto" style={{ flex: `${section.widthMm} 1 0` }}>
              <DrawingSvg list={section} title={`${title}, from the side`} className="block h-auto w-full" />
            </div>
          </div>
        </div>
        <figcaption className="mt-4 grid gap-x-10 gap-y-5 sm:grid-cols-2">
          <div>
            <p className="font-serif text-fine text-graphite">Plate {romanNumber(number)}</p>
            <h2 id={`${plateId(number)}-title`} className="font-serif text-2xl font-bold">
              {title}
            </h2>
            <p className="text-graphite">for {client}</p>
          </div>
          <dl className="space-y-3">
            <div>
              <dt className="text-fine text-graphite">True size</dt>
              <dd className="font-serif font-bold tabular-nums">
                {formatSize(widthMm, heightMm, unit)}, standing {formatLengthWithUnit(offWallMm, unit)} off the wall
              </dd>
            </div>
            <div>
              <dt className="text-fine text-graphite">What it is made of</dt>
              <dd>
                <ul>
                  {materials.map((material) => (
                    <li key={material}>{material}</li>
                  ))}
                </ul>
              </dd>
            </div>
          </dl>
        </figcaption>
      </figure>
    </article>
  );
}
