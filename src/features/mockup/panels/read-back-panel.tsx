import { lettersOf } from "#shared/dry-fit/lettering.ts";
import { isAlike, type ReadBack, type ReadCell, readBack } from "#shared/dry-fit/read-back.ts";
import { linesOf } from "#shared/dry-fit/reading-lines.ts";
import { cx } from "@/lib/cx.ts";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { choosePiece } from "../model/selection.ts";
import { Fold } from "./fold.tsx";

/** The words as they stand on the board, letter by letter beside the brief's, with every difference marked. */
export function ReadBackPanel() {
  const { figures, figuresOf, briefWords } = useDesk();
  if (figures === null) return null;
  const letters = linesOf(lettersOf({ document: figuresOf, figures }), figuresOf.lettering).flat();
  if (letters.length === 0 && briefWords.trim() === "") return null;
  const read = readBack(briefWords, letters);
  return (
    <section aria-label="Words, read back" className="border-t border-rule px-4 py-1 sm:px-6">
      <Fold name="words" summary={summaryOf(read, briefWords)}>
        <div className="flex flex-wrap items-start gap-x-8 gap-y-3 pt-1 pb-3">
          <p className="sr-only">Above each letter of the sign stands the letter of the brief.</p>
          {read.lines.map(({ words }) => (
            <div key={words[0]?.[0]?.at} className="flex flex-wrap gap-x-4 gap-y-2">
              {words.map((cells) => (
                <ol key={cells[0]?.at} className="flex flex-wrap gap-0.5">
                  {cells.map((cell) => (
                    <Cell key={cell.at} cell={cell} />
                  ))}
                </ol>
              ))}
            </div>
          ))}
        </div>
      </Fold>
    </section>
  );
}

function summaryOf({ letters, differences }: ReadBack, briefWords: string): string {
  if (briefWords.trim() === "") return `Words: the brief has none, the sign has ${counted(letters, "letter")}`;
  if (letters === 0) return "Words: no piece is said to read anything yet";
  if (differences === 0) return `Words: read as the brief, ${counted(letters, "letter")}`;
  return `Words: not as the brief in ${counted(differences, "place")}`;
}

/** A letter of the brief over the sign's. Pressed, its piece is chosen. */
function Cell({ cell }: { readonly cell: ReadCell }) {
  const { document, choose } = useDesk();
  const { brief, sign } = cell;
  const alike = isAlike(cell);
  const look = cx(
    "flex w-8 flex-col items-center border font-serif leading-tight",
    alike ? "border-rule" : "border-2 border-oxblood bg-oxblood/8",
  );
  const letters = (
    <>
      <span className="text-sm text-graphite">{brief ?? "–"}</span>
      <span aria-hidden="true" className={cx("text-fine leading-none", alike ? "text-verdigris" : "text-oxblood")}>
        {alike ? "=" : "≠"}
      </span>
      <span className={cx("text-base", alike ? "text-ink" : "font-bold text-oxblood")}>{sign?.text ?? "–"}</span>
    </>
  );
  const words = `${brief ?? "nothing"} in the brief, ${sign?.text ?? "nothing"} on the sign${alike ? "" : ", not alike"}`;
  return (
    <li>
      {sign ? (
        <button
          type="button"
          aria-label={words}
          onClick={() => choose(choosePiece(document, sign.pieceId))}
          className={cx(look, "cursor-pointer hover:bg-linen")}
        >
          {letters}
        </button>
      ) : (
        <span className={look}>
          <span className="sr-only">{words}</span>
          <span aria-hidden="true" className="contents">
            {letters}
          </span>
        </span>
      )}
    </li>
  );
}
