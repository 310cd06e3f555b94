import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import { wallStepsOf } from "../model/wall-words.ts";
import type { WallStep } from "./wall-form.tsx";

const steps = [
  { step: "mark", name: "Mark the sheet" },
  { step: "hang", name: "Hang the sign" },
] as const;

function hintOf(step: WallStep, unit: LengthUnit): string {
  if (step === "mark")
    return "Put the four marks on the sheet’s corners. Shift goes slowly; arrow keys go by 1 px, with Shift by 10.";
  const { usual, fine } = wallStepsOf(unit);
  return `Drag the sign along the wall, or move it by the arrow keys: ${formatLengthWithUnit(usual, unit)}, with Shift ${formatLengthWithUnit(fine, unit)}.`;
}

/** Whether the hand marks the sheet or moves the sign. */
export function WallSteps({ step, onStep }: { readonly step: WallStep; readonly onStep: (step: WallStep) => void }) {
  const { unit } = useDesk();
  return (
    <fieldset className="flex flex-wrap items-center gap-x-4 gap-y-1">
      <legend className="sr-only">What the hand does</legend>
      {steps.map((one) => (
        <label
          key={one.step}
          className={cx(
            "flex min-h-11 cursor-pointer items-center gap-2 border-b-2 text-base",
            step === one.step ? "border-ink font-semibold text-ink" : "border-transparent text-graphite hover:text-ink",
          )}
        >
          <input
            type="radio"
            name="wall-step"
            className="size-4 accent-indigo"
            checked={step === one.step}
            onChange={() => onStep(one.step)}
          />
          {one.name}
        </label>
      ))}
      <p className="min-w-0 flex-1 basis-72 text-sm text-graphite">{hintOf(step, unit)}</p>
    </fieldset>
  );
}
