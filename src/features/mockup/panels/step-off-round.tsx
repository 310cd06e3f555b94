import { Checkbox } from "@/components/ui/checkbox.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { StepOffDraft } from "../model/step-off-draft.ts";

type StepOffRoundProps = { readonly draft: StepOffDraft; readonly onChange: (draft: StepOffDraft) => void };

const centres: readonly { readonly centre: StepOffDraft["centre"]; readonly words: string }[] = [
  { centre: "board", words: "the board’s middle" },
  { centre: "chosen", words: "the middle of what is chosen" },
  { centre: "typed", words: "a place in figures" },
];

/** The centre that things are stepped off round, how far out and how far round. */
export function StepOffRound({ draft, onChange }: StepOffRoundProps) {
  const { unit } = useDesk();
  const change = (fields: Partial<StepOffDraft>) => onChange({ ...draft, ...fields });
  return (
    <>
      <Select
        label="Centre"
        value={draft.centre}
        onChange={(event) =>
          change({ centre: centres.find(({ centre }) => centre === event.target.value)?.centre ?? "board" })
        }
      >
        {centres.map(({ centre, words }) => (
          <option key={centre} value={centre}>
            {words}
          </option>
        ))}
      </Select>
      {draft.centre === "typed" && (
        <>
          <LengthField label="Centre x" unit={unit} fine value={draft.x} onChange={(x) => change({ x })} />
          <LengthField label="Centre y" unit={unit} fine value={draft.y} onChange={(y) => change({ y })} />
        </>
      )}
      <LengthField
        label="Radius"
        unit={unit}
        fine
        value={draft.radius}
        onChange={(radius) => change({ radius })}
        hint="Empty: as far out as it is"
      />
      <NumberField
        label="How far round"
        suffix="°"
        value={draft.sweep}
        onChange={(sweep) => change({ sweep })}
        hint="Under 0 goes counter-clockwise"
      />
      <div className="sm:col-span-2">
        <Checkbox
          label="Turn along as they go round"
          checked={draft.turned}
          onChange={(event) => change({ turned: event.target.checked })}
        />
      </div>
    </>
  );
}
