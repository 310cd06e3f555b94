import { lengthsEqual } from "#shared/geometry/tolerance.ts";
import { startPlace, startWords } from "#shared/slats/slat-words.ts";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import type { SlatsDraft } from "../model/backer-draft.ts";
import { WordButton } from "./cell-controls.tsx";

/** Where the first slat begins, what that leaves after trimming, and the best start there is. */
export function BoardSlatStart({ writing }: { readonly writing: BoardWriting }) {
  const { unit } = useDesk();
  const { draft, set, slatProblemOf, shown, laying } = writing;
  const { slats } = draft;
  const change = (more: Partial<SlatsDraft>) => set({ slats: { ...slats, ...more } });
  const place = startPlace(slats);
  const start = shown?.start ?? null;
  const best = laying.step === "laid" ? (laying.laid.start?.best ?? null) : null;
  const isTaken =
    best !== null &&
    slats.startsAt === "height" &&
    slats.startHeight !== null &&
    lengthsEqual(slats.startHeight, best.height);
  return (
    <div className="grid items-start gap-x-3 gap-y-1 sm:col-span-3 sm:grid-cols-3">
      <Select
        label="First slat begins"
        value={slats.startsAt}
        onChange={(event) => change({ startsAt: event.target.value === "height" ? "height" : "corner" })}
      >
        <option value="corner">in the corner</option>
        <option value="height">at a height</option>
      </Select>
      {slats.startsAt === "height" && (
        <LengthField
          label={place.edge === "lower" ? "Over the lower edge" : "Under the upper edge"}
          unit={unit}
          value={slats.startHeight}
          onChange={(startHeight) => change({ startHeight })}
          error={slatProblemOf("startHeight", slats.startHeight)}
          hint={`At the ${place.at}.`}
          fine
        />
      )}
      <div className="text-sm text-graphite sm:col-span-3">
        <span role="status">
          {start && startWords(start, place, unit)}
          {laying.step === "laid" && !start && laying.laid.count > 0 && "Too many slats to look for the best start."}
        </span>{" "}
        {start && (
          <WordButton
            aria-disabled={best === null || isTaken}
            onClick={() => {
              if (best && !isTaken) change({ startsAt: "height", startHeight: best.height });
            }}
          >
            {isTaken ? "This is the best start" : "Take the best start"}
          </WordButton>
        )}
      </div>
    </div>
  );
}
