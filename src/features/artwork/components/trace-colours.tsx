import type { TraceChoices } from "#shared/tracing/trace-choices.ts";
import type { FoundColour } from "#shared/tracing/traced-picture.ts";
import { Select } from "@/components/ui/select.tsx";
import { withColour } from "../model/trace-words.ts";

/** The colours found in a picture, each with what becomes of it. */
export function TraceColours({
  found,
  choices,
  onChange,
}: {
  readonly found: readonly FoundColour[];
  readonly choices: TraceChoices;
  readonly onChange: (choices: TraceChoices) => void;
}) {
  return (
    <ul className="divide-y divide-rule border-y border-rule">
      {found.map(({ colour, share, fillsRim }) => {
        const into = choices.joined.find(({ from }) => from === colour)?.into;
        const value = choices.dropped.includes(colour) ? "drop" : (into ?? "cut");
        return (
          <li key={colour} className="flex flex-wrap items-center gap-x-3 gap-y-1 py-2">
            <svg aria-hidden="true" viewBox="0 0 24 24" className="size-6 shrink-0 border border-graphite">
              <rect width="24" height="24" fill={colour} />
            </svg>
            <span className="min-w-32 flex-1 text-sm">
              {colour}, {share < 0.001 ? "under 0.1" : (share * 100).toFixed(1)} %{fillsRim && ", the background"}
            </span>
            <Select
              label={`What becomes of ${colour}`}
              labelHidden
              className="w-44"
              value={value}
              onChange={({ target }) =>
                onChange(
                  withColour(
                    choices,
                    colour,
                    target.value === "cut" || target.value === "drop" ? target.value : { into: target.value },
                  ),
                )
              }
            >
              <option value="cut">{fillsRim ? "As chosen above" : "Becomes pieces"}</option>
              <option value="drop">Drop it</option>
              {found
                .filter((other) => other.colour !== colour)
                .map((other) => (
                  <option key={other.colour} value={other.colour}>
                    Join with {other.colour}
                  </option>
                ))}
            </Select>
          </li>
        );
      })}
    </ul>
  );
}
