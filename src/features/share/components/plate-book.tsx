import type { z } from "zod";
import type { openShareLink } from "#shared/contracts/portfolio.ts";
import { countInWords } from "@/lib/format.ts";
import { romanNumber } from "../model/roman.ts";
import { Plate, plateId } from "./plate.tsx";

type PlateBookProps = { readonly book: z.infer<(typeof openShareLink)["result"]> };

/** The pieces behind a portfolio link as a book of plates: a title, a list of plates, the plates. */
export function PlateBook({ book }: PlateBookProps) {
  const { shopName, pieces, unit } = book;
  return (
    <main className="mx-auto w-full max-w-5xl px-4 pt-14 pb-20 sm:px-8 sm:pt-24">
      <header className="border-y border-ink py-10 text-center sm:py-14">
        <h1 className="font-serif text-4xl font-black sm:text-5xl">{shopName}</h1>
        <p className="mt-3 font-serif text-lg text-graphite">
          {pieces.length === 1
            ? "A layered sign, in one plate"
            : `Layered signs, in ${countInWords(pieces.length)} plates`}
        </p>
      </header>
      {pieces.length === 0 && (
        <p className="mt-12 text-center text-graphite">
          There are no plates in this book at the moment. Ask {shopName} for another link.
        </p>
      )}
      {pieces.length > 1 && (
        <nav aria-label="Plates" className="mx-auto mt-10 max-w-xl">
          <ol className="divide-y divide-rule">
            {pieces.map((piece, index) => (
              <li key={`${piece.title} ${piece.client}`}>
                <a href={`#${plateId(index + 1)}`} className="flex min-h-11 items-baseline gap-4 py-2 hover:bg-linen">
                  <span className="w-12 shrink-0 text-right font-serif text-graphite">{romanNumber(index + 1)}</span>
                  <span className="font-serif font-bold underline decoration-graphite underline-offset-4">
                    {piece.title}
                  </span>
                  <span className="ml-auto text-right text-sm text-graphite">{piece.client}</span>
                </a>
              </li>
            ))}
          </ol>
        </nav>
      )}
      <div className="mt-16 space-y-24">
        {pieces.map((piece, index) => (
          <Plate key={`${piece.title} ${piece.client}`} piece={piece} number={index + 1} unit={unit} />
        ))}
      </div>
      <footer className="mt-24 border-t border-ink pt-4 text-center text-fine text-graphite">
        Every plate is an approved drawing, shown by leave of the client. Drawn with Standproud.
      </footer>
    </main>
  );
}
