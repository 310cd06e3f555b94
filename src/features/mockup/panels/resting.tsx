import { memo, type ReactNode } from "react";

type RestingProps = {
  /** Whether a hand is dragging something that these do not follow. */
  readonly isStill: boolean;
  readonly children: ReactNode;
};

/** Panels that keep what they show while a hand drags pieces, however many rows they have: only the elevation and the section follow it. */
export const Resting = memo(
  function Resting({ children }: RestingProps) {
    return children;
  },
  (_before, { isStill }) => isStill,
);
