import { type ComponentProps, type ReactNode, useId } from "react";

type CheckboxProps = Omit<ComponentProps<"input">, "type" | "className" | "id"> & {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
};

/** One box with its words, all of them pressable. */
export function Checkbox({ label, hint, ...input }: CheckboxProps) {
  const id = useId();
  return (
    <div className="flex items-start gap-3 py-1.5">
      <input
        {...input}
        type="checkbox"
        id={id}
        aria-describedby={hint ? `${id}-hint` : undefined}
        className="mt-0.5 size-5 shrink-0 cursor-pointer accent-indigo disabled:cursor-not-allowed"
      />
      <span className="min-w-0">
        <label htmlFor={id} className="cursor-pointer text-base text-ink">
          {label}
        </label>
        {hint && (
          <span id={`${id}-hint`} className="block text-fine text-graphite">
            {hint}
          </span>
        )}
      </span>
    </div>
  );
}
