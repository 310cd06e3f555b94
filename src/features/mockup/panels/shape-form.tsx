import type { ReactNode } from "react";
import { Button } from "@/components/ui/button.tsx";
import type { Shaping } from "../engine/use-shaped.ts";

type ShapeFormProps = {
  readonly step: Shaping["step"];
  readonly picture: ReactNode;
  /** What would come of it, or why nothing does. */
  readonly words: ReactNode;
  readonly action: string;
  /** Whether what is shown can be done. */
  readonly isReady: boolean;
  readonly onTake: () => void;
  readonly onDone: () => void;
  readonly children: ReactNode;
};

/** Choices at the left, the picture of what comes of them at the right, and below it the words and the press that does it. */
export function ShapeForm({ step, picture, words, action, isReady, onTake, onDone, children }: ShapeFormProps) {
  const canTake = isReady && step === "made";
  return (
    <form
      className="grid gap-6 sm:grid-cols-[minmax(0,4fr)_minmax(0,5fr)]"
      onSubmit={(event) => {
        event.preventDefault();
        if (canTake) onTake();
      }}
    >
      <div className="space-y-3">{children}</div>
      <div className="flex flex-col gap-3">
        {picture}
        <div role="status" className="min-h-12 text-sm text-ink">
          {step === "failed" ? "This could not be worked out. Try another measure, or undo and try again." : words}
        </div>
        <div className="mt-auto flex flex-wrap justify-end gap-3">
          <Button onClick={onDone}>Cancel</Button>
          <Button type="submit" kind="primary" disabled={!canTake}>
            {action}
          </Button>
        </div>
      </div>
    </form>
  );
}
