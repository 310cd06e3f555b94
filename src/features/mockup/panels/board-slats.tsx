import type { Slats } from "#shared/mockup/document.ts";
import { formatLength, formatLengthWithUnit } from "#shared/units/format-length.ts";
import { LengthField } from "@/components/ui/length-field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import type { SlatsDraft } from "../model/backer-draft.ts";
import { isAsked } from "../model/backer-problems.ts";
import { BoardSlatStart } from "./board-slat-start.tsx";
import { SlatPlan } from "./slat-plan.tsx";
import { WoodSelect } from "./stock-fields.tsx";

const patterns: readonly { readonly pattern: Slats["pattern"]; readonly text: string }[] = [
  { pattern: "spine", text: "chevron on a spine" },
  { pattern: "mitred", text: "mitred to each other" },
  { pattern: "single", text: "one direction" },
];

type LengthName = "thickness" | "slatWidth" | "gap" | "spineWidth" | "spineOffset" | "overhang";

/** The slats: their wood and measures, how they are laid, and a picture of them as they lie. */
export function BoardSlats({ writing }: { readonly writing: BoardWriting }) {
  const { document, unit } = useDesk();
  const { draft, set, slatProblemOf } = writing;
  const { slats } = draft;
  const change = (more: Partial<SlatsDraft>) => set({ slats: { ...slats, ...more } });
  const isSingle = slats.pattern === "single";
  const length = (name: LengthName, label: string, hint?: string) => (
    <LengthField
      label={label}
      unit={unit}
      value={slats[name]}
      onChange={(mm) => change({ [name]: mm })}
      error={slatProblemOf(name, slats[name])}
      {...(hint ? { hint } : {})}
    />
  );
  return (
    <fieldset className="min-w-0">
      <legend className="pb-1 font-sans text-sm font-semibold text-graphite">Slats</legend>
      <div className="grid items-start gap-4 md:grid-cols-[minmax(0,1fr)_18rem]">
        <div className="grid items-start gap-3 sm:grid-cols-3">
          <div className="grid items-start gap-3 sm:col-span-3 sm:grid-cols-2">
            <WoodSelect
              label="Wood of the slats"
              value={slats.stock}
              drawn={document.backer.slats?.stock ?? document.backer.stock}
              onChange={(wood) => change({ stock: wood })}
            />
            <Select
              label="Pattern"
              value={slats.pattern}
              error={slatProblemOf("pattern", slats.pattern)}
              onChange={(event) => {
                const chosen = patterns.find(({ pattern }) => pattern === event.target.value);
                if (chosen) change({ pattern: chosen.pattern });
              }}
            >
              {patterns.map(({ pattern, text }) => (
                <option key={pattern} value={pattern}>
                  {text}
                </option>
              ))}
            </Select>
          </div>
          {length("slatWidth", "Width of a slat")}
          {length("thickness", "Thickness of a slat")}
          {length("gap", "Gap between slats")}
          <NumberField
            label={slats.pattern === "spine" ? "Angle to the spine" : "Angle to the upright"}
            suffix="°"
            value={slats.angle}
            onChange={(angle) => change({ angle })}
            error={slatProblemOf("angle", slats.angle)}
          />
          <Select
            label="Slats run"
            {...(isSingle ? { hint: "Towards the right." } : {})}
            value={slats.direction}
            onChange={(event) => change({ direction: event.target.value === "down" ? "down" : "up" })}
          >
            <option value="up">{isSingle ? "upward" : "up and out"}</option>
            <option value="down">{isSingle ? "downward" : "down and out"}</option>
          </Select>
          {length(
            "overhang",
            "Laid past the edge",
            `Then trimmed flush. Common: ${formatLength(25, unit)} to ${formatLengthWithUnit(50, unit)}.`,
          )}
          {isAsked(slats, "spineWidth") && length("spineWidth", "Width of the spine")}
          {isAsked(slats, "spineOffset") &&
            length(
              "spineOffset",
              slats.pattern === "spine" ? "Spine right of middle" : "Mitres right of middle",
              "Under 0 is to the left.",
            )}
          <BoardSlatStart writing={writing} />
        </div>
        <SlatPlan writing={writing} />
      </div>
    </fieldset>
  );
}
