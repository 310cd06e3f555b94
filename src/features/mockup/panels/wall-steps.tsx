import { cx } from "@/lib/cx.ts";
import type { WallStep } from "./wall-form.tsx";

const steps = [
  {
    step: "mark",
    name: "Mark the sheet",
    hint: "Put the four marks on the sheet’s corners. Shift goes slowly; arrow keys go by 1 px, with Shift by 10.",
  },
  {
    step: "hang",
    name: "Hang the sign",
    hint: "Drag the sign along the wall, or move it by the arrow keys: 10 mm, with Shift 1 mm.",
  },
] as const;

/** Whether the hand marks the sheet or moves the sign. */
export function WallSteps({ step, onStep }: { readonly step: WallStep; readonly onStep: (step: WallStep) => void }) {
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
      <p className="min-w-0 flex-1 basis-72 text-sm text-graphite">{steps.find((one) => one.step === step)?.hint}</p>
    </fieldset>
  );
}
