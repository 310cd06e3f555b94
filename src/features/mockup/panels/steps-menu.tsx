import { Popover } from "radix-ui";
import { type KeyboardEvent, type Ref, useRef, useState } from "react";
import { cx } from "@/lib/cx.ts";
import { type History, stepsInWords } from "../model/history.ts";
import { WordButton } from "./cell-controls.tsx";

/** How many steps are listed at first, and how many more with each press. */
const page = 50;

type StepsMenuProps = {
  readonly history: History;
  /** To where so many steps are done; 0 is how the mockup was opened. */
  readonly onGoTo: (position: number) => void;
};

/** Every step of the session in words, the newest first. A press goes back to it, or forward again. */
export function StepsMenu({ history, onGoTo }: StepsMenuProps) {
  const [open, setOpen] = useState(false);
  const [count, setCount] = useState(page);
  const now = useRef<HTMLButtonElement>(null);
  const steps = stepsInWords(history);
  const position = history.past.length;
  // What was undone stands above, so that the step that is done last is always among those shown.
  const shown = steps.slice(0, history.future.length + count);
  const isWhole = shown.length === steps.length;

  return (
    <Popover.Root
      open={open}
      onOpenChange={(isOpen) => {
        setOpen(isOpen);
        setCount(page);
      }}
    >
      <Popover.Trigger asChild>
        <WordButton disabled={steps.length === 0}>Steps</WordButton>
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          align="end"
          sideOffset={6}
          aria-label="Steps, the newest first"
          className="z-30 max-h-[min(26rem,var(--radix-popover-content-available-height))] w-72 overflow-y-auto border border-ink bg-sheet py-1"
          onOpenAutoFocus={(event) => {
            event.preventDefault();
            now.current?.focus();
          }}
        >
          <p className="px-3 py-1 text-fine text-graphite">
            Press a step to go to where it was done last. What comes after it stays until you draw on.
          </p>
          <ol onKeyDown={moveAlong}>
            {shown.map(({ position: at, label, isUndone }) => (
              <StepItem
                key={at}
                ref={at === position ? now : null}
                label={label}
                isNow={at === position}
                isUndone={isUndone}
                onPress={() => onGoTo(at)}
              />
            ))}
            {isWhole && (
              <StepItem
                ref={position === 0 ? now : null}
                label="As it was opened"
                isNow={position === 0}
                isUndone={false}
                onPress={() => onGoTo(0)}
              />
            )}
          </ol>
          {!isWhole && (
            <button
              type="button"
              className="w-full cursor-pointer px-3 py-1.5 text-left text-sm font-semibold underline underline-offset-4 hover:bg-linen"
              onClick={() => setCount((before) => before + page)}
            >
              Earlier steps ({steps.length - shown.length})
            </button>
          )}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}

/** Arrows up and down go from step to step, as Tab does. */
function moveAlong(event: KeyboardEvent<HTMLOListElement>) {
  const way = event.key === "ArrowDown" ? 1 : event.key === "ArrowUp" ? -1 : 0;
  if (way === 0) return;
  event.preventDefault();
  const buttons = [...event.currentTarget.querySelectorAll("button")];
  const at = buttons.indexOf(window.document.activeElement as HTMLButtonElement);
  buttons[Math.min(buttons.length - 1, Math.max(0, at + way))]?.focus();
}

type StepItemProps = {
  readonly ref: Ref<HTMLButtonElement>;
  readonly label: string;
  readonly isNow: boolean;
  readonly isUndone: boolean;
  readonly onPress: () => void;
};

function StepItem({ ref, label, isNow, isUndone, onPress }: StepItemProps) {
  return (
    <li>
      <button
        ref={ref}
        type="button"
        aria-current={isNow ? "step" : undefined}
        onClick={onPress}
        className={cx(
          "flex min-h-8 w-full cursor-pointer items-baseline justify-between gap-3 px-3 py-1 text-left text-sm hover:bg-linen",
          isNow ? "font-semibold text-ink" : isUndone ? "text-graphite" : "text-ink",
        )}
      >
        <span className={cx("min-w-0 break-words", isUndone && "italic")}>{label}</span>
        <span className="shrink-0 text-fine text-graphite">{isNow ? "here" : isUndone ? "undone" : ""}</span>
      </button>
    </li>
  );
}
