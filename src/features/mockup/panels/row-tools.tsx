import type { Layer } from "#shared/mockup/document.ts";
import { WordButton } from "./cell-controls.tsx";

type RowToolsProps = {
  readonly layer: Layer;
  readonly isFirst: boolean;
  readonly isLast: boolean;
  readonly onMove: (towards: "viewer" | "wall") => void;
  readonly onHide: () => void;
  readonly onRemove: () => void;
};

/** What can be done with a layer as a whole. Nothing asks back: Undo brings it all again. */
export function RowTools({ layer, isFirst, isLast, onMove, onHide, onRemove }: RowToolsProps) {
  const { key, hidden } = layer;
  return (
    <span className="flex items-center justify-end whitespace-nowrap">
      <Arrow
        label={`Move ${key} towards the wall`}
        path="M8 13V3M4 7l4-4 4 4"
        disabled={isFirst}
        onPress={() => onMove("wall")}
      />
      <Arrow
        label={`Move ${key} towards the viewer`}
        path="M8 3v10M4 9l4 4 4-4"
        disabled={isLast}
        onPress={() => onMove("viewer")}
      />
      <WordButton aria-label={`${hidden ? "Show" : "Hide"} ${key} in the picture`} onClick={onHide}>
        {hidden ? "Show" : "Hide"}
      </WordButton>
      <WordButton aria-label={`Remove ${key}`} onClick={onRemove}>
        Remove
      </WordButton>
    </span>
  );
}

function Arrow({
  label,
  path,
  disabled,
  onPress,
}: {
  label: string;
  path: string;
  disabled: boolean;
  onPress: () => void;
}) {
  return (
    <button
      type="button"
      aria-label={label}
      title={label}
      disabled={disabled}
      onClick={onPress}
      className="inline-flex size-8 cursor-pointer items-center justify-center rounded border border-transparent text-indigo hover:border-indigo disabled:cursor-not-allowed disabled:text-rule"
    >
      <svg
        aria-hidden="true"
        viewBox="0 0 16 16"
        className="size-4"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.4"
      >
        <path d={path} />
      </svg>
    </button>
  );
}
