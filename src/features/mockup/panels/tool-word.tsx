import type { ComponentProps } from "react";
import { useDesk } from "../editor/desk-context.ts";
import { WordButton } from "./cell-controls.tsx";

type ToolWordProps = Omit<ComponentProps<typeof WordButton>, "disabled"> & {
  /** Why it can't be done now, in words; null when it can. An idle word still takes the focus and says why. */
  readonly why: string | null;
};

/** A word of the bar that does something to what is chosen. */
export function ToolWord({ why, onClick, title, ...button }: ToolWordProps) {
  const { say } = useDesk();
  return (
    <WordButton
      {...button}
      aria-disabled={why !== null}
      title={why ?? title}
      onClick={why === null ? onClick : () => say(why)}
    />
  );
}
