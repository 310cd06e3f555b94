import { Checkbox } from "@/components/ui/checkbox.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import {
  haveHoles,
  needsLength,
  type StepOffDraft,
  type StepOffShape,
  type StepOffSpacing,
  spacingsFor,
} from "../model/step-off-draft.ts";
import { togethers } from "../model/together.ts";
import { StepOffRound } from "./step-off-round.tsx";

type StepOffFieldsProps = { readonly draft: StepOffDraft; readonly onChange: (draft: StepOffDraft) => void };

const shapes: readonly { readonly shape: StepOffShape; readonly words: string }[] = [
  { shape: "across", words: "across the board" },
  { shape: "down", words: "down the board" },
  { shape: "at an angle", words: "on a line at an angle" },
  { shape: "round", words: "round a centre" },
];

const spacingWords: Record<StepOffSpacing, string> = {
  gap: "gap, edge to edge",
  pitch: "pitch, of middles",
  over: "parts of a length",
  "equal gaps": "equal gaps",
  "equal pitch": "equal pitch",
};
const lengthLabels = { gap: "Gap", pitch: "Pitch", over: "Length", "equal gaps": "Gap", "equal pitch": "Pitch" };

/** What is stepped off, along what, and how far apart. */
export function StepOffFields({ draft, onChange }: StepOffFieldsProps) {
  const { document, selection, unit } = useDesk();
  const change = (fields: Partial<StepOffDraft>) => onChange({ ...draft, ...fields });
  const isCopying = draft.what === "copies";

  function changeWhat(what: StepOffDraft["what"]) {
    const spacings = spacingsFor(what);
    const [usual = draft.spacing] = spacings;
    change({
      what,
      spacing: spacings.includes(draft.spacing) ? draft.spacing : usual,
      together: what === "chosen" && draft.together === "all as one" ? "each piece" : draft.together,
    });
  }

  return (
    <div className="grid gap-3 sm:grid-cols-2">
      <Select
        label="What"
        value={draft.what}
        onChange={(event) => changeWhat(event.target.value === "copies" ? "copies" : "chosen")}
      >
        <option value="copies">copies of it</option>
        <option value="chosen">the pieces themselves</option>
      </Select>
      {isCopying ? (
        <NumberField label="Copies" value={draft.count} onChange={(count) => change({ count })} />
      ) : (
        <Select
          label="What moves"
          value={draft.together}
          onChange={(event) =>
            change({ together: togethers.find((one) => one === event.target.value) ?? draft.together })
          }
        >
          {togethers.map((one) => (
            <option key={one}>{one}</option>
          ))}
        </Select>
      )}
      <Select
        label="Where"
        value={draft.shape}
        onChange={(event) =>
          change({ shape: shapes.find(({ shape }) => shape === event.target.value)?.shape ?? "across" })
        }
      >
        {shapes.map(({ shape, words }) => (
          <option key={shape} value={shape}>
            {words}
          </option>
        ))}
      </Select>
      {draft.shape === "at an angle" && (
        <NumberField
          label="Angle"
          suffix="°"
          hint="Clockwise from level"
          value={draft.angle}
          onChange={(angle) => change({ angle })}
        />
      )}
      {draft.shape === "round" ? (
        <StepOffRound draft={draft} onChange={onChange} />
      ) : (
        <Select
          label="How far apart"
          {...(!needsLength(draft) && { hint: "The first and the last stay" })}
          value={draft.spacing}
          onChange={(event) =>
            change({ spacing: spacingsFor(draft.what).find((one) => one === event.target.value) ?? draft.spacing })
          }
        >
          {spacingsFor(draft.what).map((spacing) => (
            <option key={spacing} value={spacing}>
              {spacingWords[spacing]}
            </option>
          ))}
        </Select>
      )}
      {needsLength(draft) && (
        <LengthField
          label={lengthLabels[draft.spacing]}
          unit={unit}
          fine
          value={draft.mm}
          onChange={(mm) => change({ mm })}
          {...(isCopying && { hint: "Under 0 goes the other way" })}
        />
      )}
      {!isCopying && draft.shape !== "round" && (
        <div className="sm:col-span-2">
          <Checkbox
            label="Bring their middles onto one line"
            checked={draft.onto}
            onChange={(event) => change({ onto: event.target.checked })}
          />
        </div>
      )}
      {isCopying && haveHoles(document, selection.pieceIds) && (
        <div className="sm:col-span-2">
          <Checkbox
            label="With the standoff holes in it"
            checked={draft.withHoles}
            onChange={(event) => change({ withHoles: event.target.checked })}
          />
        </div>
      )}
    </div>
  );
}
