import { boxGrow } from "#shared/geometry/box.ts";
import { pathToText } from "#shared/geometry/path-text.ts";
import { placePath } from "#shared/geometry/placement.ts";
import type { LaidWords } from "#shared/lettering/lay-words.ts";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { counted } from "@/lib/format.ts";
import type { LaidWordsState } from "../engine/use-laid-words.ts";
import { missingWords, touchingWords } from "../model/lettering-words.ts";

type LetteringPreviewProps = {
  readonly state: LaidWordsState;
  readonly shown: LaidWords | null;
  /** As lists show the face that the words are set in. */
  readonly face: string;
  readonly unit: LengthUnit;
};

/** The words as they will be cut, how wide and high they are, and what is amiss. */
export function LetteringPreview({ state, shown, face, unit }: LetteringPreviewProps) {
  const missing = shown && missingWords(shown.missing, face);
  const touching = shown && touchingWords(shown);
  return (
    <div className="space-y-2">
      <div className="flex h-40 items-center justify-center border border-rule bg-paper p-3">
        {shown?.box ? (
          <Letters laid={shown} box={shown.box} />
        ) : (
          <p className="text-sm text-graphite">
            {state.step === "laying" ? "Setting the words…" : "The words show here as they will be cut."}
          </p>
        )}
      </div>
      <div aria-live="polite" className="space-y-1 text-sm text-ink">
        {shown?.box && (
          <p className="tabular-nums">
            {counted(shown.letters.length, "letter")}, in all {formatLengthWithUnit(shown.box.width, unit)} wide and{" "}
            {formatLengthWithUnit(shown.box.height, unit)} high.
          </p>
        )}
        {(state.step === "refused" || state.step === "failed") && <p className="text-oxblood">{state.problem}</p>}
        {missing && <p className="text-oxblood">{missing}</p>}
        {touching && <p className="text-ochre">{touching}</p>}
      </div>
    </div>
  );
}

function Letters({ laid, box }: { readonly laid: LaidWords; readonly box: NonNullable<LaidWords["box"]> }) {
  const { x, y, width, height } = boxGrow(box, Math.max(box.width, box.height) / 60);
  const touching = new Set(laid.touching.flat());
  return (
    <svg aria-hidden="true" viewBox={`${x} ${y} ${width} ${height}`} className="size-full">
      {laid.letters.map(({ letter, path, laid: at }) => (
        <path
          key={letter}
          d={pathToText(placePath(path, { ...at, scale: 1, mirrored: false }))}
          fillRule="evenodd"
          className={touching.has(letter) ? "fill-ochre" : "fill-ink"}
        />
      ))}
    </svg>
  );
}
