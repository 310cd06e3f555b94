import type { LengthUnit } from "#shared/units/length.ts";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { boundsProblem } from "../model/length-bounds.ts";
import { type LetteringDraft, type LetteringLength, letteringBounds } from "../model/lettering-draft.ts";

type LetteringFieldsProps = {
  readonly draft: LetteringDraft;
  readonly set: (change: Partial<LetteringDraft>) => void;
  readonly unit: LengthUnit;
};

const aligns = ["left", "centre", "right"] as const;
const alongs = [
  { along: "line", text: "straight" },
  { along: "over", text: "over an arc" },
  { along: "under", text: "in a bowl" },
] as const;

/** How words are set: size, spaces, how lines are lined up, and along what. */
export function LetteringFields({ draft, set, unit }: LetteringFieldsProps) {
  const length = (name: LetteringLength, label: string, hint?: string) => (
    <LengthField
      label={label}
      unit={unit}
      fine
      value={draft[name]}
      onChange={(mm) => set({ [name]: mm })}
      error={boundsProblem(draft[name], letteringBounds[name], unit)}
      {...(hint ? { hint } : {})}
    />
  );
  return (
    <div className="grid gap-x-3 gap-y-3 sm:grid-cols-2 lg:grid-cols-3">
      {length("capHeight", "Capitals, high", "Of an H, over the line.")}
      {length("letterSpacing", "Space between letters", "Added to the face’s own; less than 0 is closer.")}
      <Checkbox
        label="Kerned"
        hint="Pairs as AV are drawn together as the face says."
        checked={draft.kerning}
        onChange={(event) => set({ kerning: event.target.checked })}
      />
      <Select
        label="Runs"
        value={draft.along}
        onChange={(event) => {
          const chosen = alongs.find(({ along }) => along === event.target.value);
          if (chosen) set({ along: chosen.along });
        }}
      >
        {alongs.map(({ along, text }) => (
          <option key={along} value={along}>
            {text}
          </option>
        ))}
      </Select>
      {draft.along !== "line" && length("radius", "Radius", "Of the arc that the letters’ feet stand on.")}
      <Select
        label="Lined up"
        value={draft.align}
        onChange={(event) => {
          const align = aligns.find((one) => one === event.target.value);
          if (align) set({ align });
        }}
      >
        {aligns.map((align) => (
          <option key={align}>{align}</option>
        ))}
      </Select>
      {draft.words.includes("\n") && length("lineSpacing", "From line to line")}
    </div>
  );
}
